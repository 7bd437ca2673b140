/**
 * A text that a spreadsheet takes as text. What begins like a formula gets a leading single quote; numbers of ours are written as numbers
 * and don't come through here.
 * @source OWASP ASVS 5.0.0, V1.2.10: first character = + - @ tab or NUL; carriage return added for spreadsheets that skip it
 */
export function safeCell(text: string): string {
  return /^[=+\-@\t\r\0]/.test(text) ? `'${text}` : text;
}
