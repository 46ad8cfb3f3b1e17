/** How long a session lasts from signing in: the row in the database and the cookie alike. */
export const SESSION_HOURS = 12;
