import { WebVTTCueTextParser, type CueNode } from "webvtt-parser";
// The parser knows five entities unless it is handed all of them.
import entities from "webvtt-parser/html-entities.json";

/** A cue's text without its markup: what is searched, and what a chapter is called. Ruby annotations are left out. */
export function cuePlainText(text: string): string {
  const ignored = () => undefined;
  return new WebVTTCueTextParser(text, ignored, "subtitles", entities).parse(0, Number.MAX_SAFE_INTEGER).children.map(plainText).join("");
}

function plainText(node: CueNode): string {
  if (node.type === "text") return node.value;
  if (node.type === "timestamp" || node.name === "rt") return "";
  return node.children.map(plainText).join("");
}

/** A plain text as cue text: what would be markup is escaped, and it stays on one line. */
export function escapeCueText(text: string): string {
  return text.replace(/\s*[\r\n]+\s*/g, " ").replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;");
}
