const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;

/** What is no id names nothing: as missing as a foreign one, and no question for the database. */
export const isId = (text: string | undefined): text is string => text !== undefined && UUID.test(text);
