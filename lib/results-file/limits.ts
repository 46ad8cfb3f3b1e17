/** Size of a file, bytes. */
export const MAX_BYTES = 20 * 1024 * 1024;
/** Rows with content, the header not counted. */
export const MAX_ROWS = 100_000;
/** Characters in one cell. */
export const MAX_CELL = 2_000;
/** Characters in the name of a laboratory. */
export const MAX_LABORATORY = 120;
/** Characters in one physical line: far more than the named columns can fill, far less than would fill the memory. */
export const MAX_LINE = 200_000;
/** Physical lines up to the last one with content: quoted line breaks and empty rows among them. */
export const MAX_LINES = 500_000;
/** Characters in a comment. */
export const MAX_COMMENT = 500;
/** Problems that are listed; the rest is counted. */
export const MAX_PROBLEMS = 200;
/** Notices that are listed; the rest is counted. */
export const MAX_NOTICES = 200;
/** Coverage factors outside these are taken for an uncertainty in the wrong column. */
export const MIN_COVERAGE_FACTOR = 1;
export const MAX_COVERAGE_FACTOR = 10;
export const DEFAULT_COVERAGE_FACTOR = 2;
