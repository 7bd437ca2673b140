import { Refusal } from "@/storage/fake/refusal";

/** What an element holds when written: text, children, or nothing at all (left out). */
export type XmlContent = string | number | boolean | undefined | XmlChildren;
export type XmlChildren = { [name: string]: XmlContent | XmlContent[] };

/** An element as read. `text` is the text directly inside it. */
export type XmlElement = { name: string; text: string; children: XmlElement[] };

const NAMESPACE = "http://s3.amazonaws.com/doc/2006-03-01/";

// Control characters are written as references, as S3 does, so that a key with a line feed in it comes back whole.
const escape = (text: string) =>
  text.replace(/[&<>"\u0000-\u001f\u007f]/g, (character) => `&#x${character.charCodeAt(0).toString(16).toUpperCase()};`);

function element(name: string, content: XmlContent | XmlContent[]): string {
  if (content === undefined) return "";
  if (Array.isArray(content)) return content.map((each) => element(name, each)).join("");
  if (typeof content !== "object") return `<${name}>${escape(String(content))}</${name}>`;
  const inner = Object.entries(content).map(([child, value]) => element(child, value));
  return `<${name}>${inner.join("")}</${name}>`;
}

/** A whole document. An array repeats its element; undefined leaves it out. Errors carry no namespace, all else does. */
export function writeXml(name: string, content: XmlChildren): string {
  const body = element(name, content);
  const opening = name === "Error" ? body : body.replace(`<${name}>`, `<${name} xmlns="${NAMESPACE}">`);
  return `<?xml version="1.0" encoding="UTF-8"?>\n${opening}`;
}

const NAMED: Record<string, string> = { amp: "&", lt: "<", gt: ">", quot: '"', apos: "'" };

function unescape(text: string): string {
  return text.replace(/&(?:#x([0-9a-f]+)|#(\d+)|(\w+));/gi, (whole, hex?: string, decimal?: string, name?: string) => {
    if (name !== undefined) return NAMED[name] ?? whole;
    const code = hex === undefined ? Number(decimal) : Number.parseInt(hex, 16);
    return code <= 0x10ffff ? String.fromCodePoint(code) : whole;
  });
}

/**
 * Reads the small documents that S3 requests carry: elements and text. Attributes are passed over; a document type is
 * refused, so no entity can be declared.
 * @throws Refusal MalformedXML
 */
export function readXml(text: string): XmlElement {
  const malformed = new Refusal("MalformedXML", "The XML that was sent is not well formed.");
  const root: XmlElement = { name: "", text: "", children: [] };
  const open = [root];
  const token = /<\?[^>]*\?>|<!--[\s\S]*?-->|<(\/?)([\w:.-]+)[^<>]*?(\/?)>|([^<]+)|(<)/g;
  for (const [, closing, name, empty, content, stray] of text.replace(/^\ufeff/, "").matchAll(token)) {
    const top = open.at(-1);
    if (stray !== undefined || top === undefined) throw malformed;
    if (content !== undefined) top.text += unescape(content);
    if (name === undefined) continue;
    if (closing === "/") {
      if (open.length === 1 || top.name !== name) throw malformed;
      open.pop();
      continue;
    }
    const child: XmlElement = { name, text: "", children: [] };
    top.children.push(child);
    if (empty !== "/") open.push(child);
  }
  const [document] = root.children;
  if (open.length !== 1 || root.children.length !== 1 || document === undefined) throw malformed;
  return document;
}

/** The text of the first child of that name, or undefined. */
export const childText = (parent: XmlElement, name: string): string | undefined =>
  parent.children.find((child) => child.name === name)?.text;
