/** One step of the path shown in the header. The last one is where the reader is, and needs no address. */
export interface Crumb {
	label: string;
	href?: string;
}
