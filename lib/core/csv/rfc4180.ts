/**
 * How the CSV writer is set so that what it writes is RFC 4180: lines end in CRLF, and a cell with any part of a line end is quoted. By
 * itself the writer quotes only the whole CRLF, and a cell with a bare line feed would break its row in two.
 * @source RFC 4180, section 2, rules 1 and 6
 */
export const RFC_4180 = { record_delimiter: "\r\n", quoted_match: /[\r\n]/ };
