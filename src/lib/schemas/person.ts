/** A room of the site that a person may enter, as the menu under their name lists it. */
export interface RoomLink {
	label: string;
	href: string;
}

/** Who is signed in, as pages see it. Roles are words, such as “company contact”. */
export interface PersonView {
	displayName: string;
	email: string;
	roles: string[];
	rooms: RoomLink[];
}
