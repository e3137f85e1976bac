/** What was typed into a field and why it was refused; it stays in the field until it is put right or put away. */
export interface FieldRefusal {
	text: string;
	message: string;
}
