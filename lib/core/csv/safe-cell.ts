/**
 * A text that a spreadsheet takes as text. What begins like a formula gets a leading single quote; numbers of ours are written as numbers
 * and don't come through here. Not for files that programs read: the quote would change what they get.
 * @source OWASP ASVS 5.0.0, V1.2.10: first character = + - @ tab or NUL. Carriage return, line feed and the full-width signs added for
 *         spreadsheets that skip or fold them (OWASP, "CSV Injection", from memory).
 */
export function safeCell(text: string): string {
  return /^[=+\-@\t\r\n\0＝＋－＠]/.test(text) ? `'${text}` : text;
}
