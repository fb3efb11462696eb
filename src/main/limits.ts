/** How large a file may be before it is read at all. */

export const STUDY_LIMIT_BYTES = 8 * 2 ** 20;

/** For one table, and for all tables of a study together; a million rows take about 40 MB. */
export const TABLE_LIMIT_BYTES = 512 * 2 ** 20;
