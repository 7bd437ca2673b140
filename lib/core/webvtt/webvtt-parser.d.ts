declare module "webvtt-parser/html-entities.json" {
  const entities: Record<string, string>;
  export default entities;
}

/** The part of webvtt-parser that we use; the package ships no types. Times in seconds. */
declare module "webvtt-parser" {
  export type CueNode =
    | { type: "text"; value: string }
    | { type: "timestamp"; value: number }
    | { type: "object"; name: string; classes: string[]; value?: string; children: CueNode[] };
  export type ParsedCue = { id: string; startTime: number; endTime: number; text: string };
  export type ParseError = { message: string; line: number; col?: number };
  export class WebVTTParser {
    parse(input: string, mode: "metadata" | "chapters" | "subtitles/captions/descriptions"): { cues: ParsedCue[]; errors: ParseError[] };
  }
  export class WebVTTCueTextParser {
    constructor(line: string, errorHandler: (message: string) => void, mode: string, entities: Record<string, string>);
    parse(cueStart: number, cueEnd: number): { children: CueNode[] };
  }
}
