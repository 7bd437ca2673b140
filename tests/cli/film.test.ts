import { closeSync, openSync, readFileSync, readSync, statSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { DEMO_FILMS, MEDIA_FILES, mediaPath, type DemoFilm } from "@/db/seeds/demo/films/films";
import { framesOf } from "@/lib/cli/film/draw";
import { frame } from "@/lib/cli/film/frame";
import { layOut } from "@/lib/cli/film/timeline";
import { SIGNS } from "@/lib/core/steps/iso-7010";
import { stepPublishProblems } from "@/lib/core/steps/publish-problems";
import { stepProblems } from "@/lib/core/steps/step-problems";
import { findUnit } from "@/lib/core/units/units";
import { readVtt } from "@/lib/core/webvtt/read-vtt";

const MINUTE = 60_000;
const SIZE_LIMIT_BYTES = 12_000_000;

/** Boxes at the top of an MP4 file, and the length that its `mvhd` states. Source: ISO/IEC 14496-12, 4.2 and 8.2.2 (from memory). */
function readMp4(path: string): { boxes: string[]; durationMs: number } {
  const file = openSync(path, "r");
  const boxes: string[] = [];
  let durationMs = 0;
  const at = (offset: number, length: number): Buffer => {
    const bytes = Buffer.alloc(length);
    readSync(file, bytes, 0, length, offset);
    return bytes;
  };
  for (let offset = 0, end = statSync(path).size; offset < end; ) {
    const size = at(offset, 4).readUInt32BE(0);
    const type = at(offset + 4, 4).toString("latin1");
    boxes.push(type);
    if (type === "moov") {
      const header = at(offset + 8, 32);
      expect(header.toString("latin1", 4, 8)).toBe("mvhd");
      durationMs = (header.readUInt32BE(24) / header.readUInt32BE(20)) * 1000;
    }
    offset += Math.max(8, size);
  }
  closeSync(file);
  return { boxes, durationMs };
}

/** Every tag closed in its order, every attribute quoted, no bare ampersand: what well-formed asks of the little that we write. */
function expectWellFormed(svg: string): void {
  const open: string[] = [];
  for (const [, close, name, attributes = "", self] of svg.matchAll(/<(\/?)([a-zA-Z]+)((?:\s[^<>]*?)?)(\/?)>/g)) {
    expect(attributes.replace(/\s[\w:-]+="[^"<]*"/g, "").trim()).toBe("");
    if (close === "/") expect(open.pop()).toBe(name);
    else if (self !== "/") open.push(name ?? "");
  }
  expect(open).toEqual([]);
  expect(svg.replace(/<[^<>]*>/g, "")).not.toMatch(/[<>]/);
  expect(svg).not.toMatch(/&(?!amp;|lt;|gt;|quot;)/);
  expect(svg).not.toMatch(/NaN|undefined|Infinity/);
}

describe.each(DEMO_FILMS.map((film): [string, DemoFilm] => [film.key, film]))("the film %s", (key, { script, timings, markingOut }) => {
  test("is as long as it says, between three and a half and six minutes, with its index up front", () => {
    for (const file of ["720p.mp4", "480p.mp4"] as const) {
      const { boxes, durationMs } = readMp4(mediaPath(key, file));
      expect(boxes.indexOf("moov")).toBeLessThan(boxes.indexOf("mdat"));
      expect(durationMs).toBeGreaterThanOrEqual(3.5 * MINUTE);
      expect(durationMs).toBeLessThanOrEqual(6 * MINUTE);
      expect(Math.abs(durationMs - timings.durationMs)).toBeLessThanOrEqual(250);
    }
  });

  test("was made from the script that is here: same steps, same sentences", () => {
    expect(timings.steps.map(({ key: step, title }) => [step, title])).toEqual(script.steps.map((step) => [step.key, step.title]));
    expect(timings.lines.map(({ text }) => text)).toEqual(script.steps.flatMap((step) => step.scenes.flatMap((scene) => scene.lines.map(({ text }) => text))));
  });

  test("has steps without gap or overlap from its first frame to its last", () => {
    const { steps } = markingOut;
    expect(stepProblems(steps, timings.durationMs)).toEqual([]);
    expect(steps[0]?.startMs).toBe(0);
    steps.slice(1).forEach((step, index) => expect(step.startMs).toBe(steps[index]?.endMs));
    expect(steps.at(-1)?.endMs).toBe(timings.durationMs);
  });

  test("asks every question inside its step, after what it asks about, and never two at once", () => {
    const { steps, questions } = markingOut;
    for (const question of questions) {
      const step = steps.find(({ id }) => id === question.stepId);
      expect(question.atMs).toBeGreaterThan(step?.startMs ?? Infinity);
      expect(question.atMs).toBeLessThan(step?.endMs ?? 0);
      expect(question.lookAgainMs).toBeLessThan(question.atMs);
      // The film must not be talking when it stops.
      expect(timings.lines.filter((line) => line.startMs <= question.atMs && question.atMs < line.endMs)).toEqual([]);
    }
    expect(new Set(questions.map(({ atMs }) => atMs)).size).toBe(questions.length);
    expect(new Set([...steps, ...questions].map(({ id }) => id)).size).toBe(steps.length + questions.length);
  });

  test("holds questions that can be marked", () => {
    for (const { body, prompt } of markingOut.questions) {
      if (body.kind === "one_of") expect([prompt, body.choices.filter(({ right }) => right).length]).toEqual([prompt, 1]);
      else if (body.kind === "number") {
        expect([prompt, findUnit(body.unit)?.symbol]).toEqual([prompt, body.unit]);
        for (const slip of body.slips) expect(Math.abs(slip.value - body.value)).toBeGreaterThan(body.tolerance);
      } else {
        const place = (id: string): number => body.items.findIndex((item) => item.id === id);
        for (const [early, late] of body.neverBefore) {
          expect(place(late)).toBeGreaterThanOrEqual(0);
          // x before y is never right, so the right order has y first.
          expect(place(early)).toBeGreaterThan(place(late));
        }
      }
    }
  });

  test("says of every tightening value that it is invented, and knows every sign", () => {
    const { steps } = markingOut;
    expect(steps.flatMap(stepPublishProblems)).toEqual([]);
    const tightenings = steps.flatMap(({ facts }) => facts.fasteners.flatMap(({ tightening }) => tightening ?? []));
    expect(tightenings.length).toBeGreaterThanOrEqual(2);
    for (const { source } of tightenings) expect(source).toMatch(/invented/i);
    for (const { sign, instruction } of steps.flatMap(({ facts }) => facts.cautions)) {
      expect(SIGNS[sign]).toBeDefined();
      expect(instruction).toMatch(/maker's data and local rules come first/);
    }
    expect(script.summary).toMatch(/condensed/);
    expect(script.summary).toMatch(/invented/);
  });

  test("gives each caution before the work of its step", () => {
    for (const step of script.steps) {
      const cautions = step.scenes.flatMap((scene, index) => (scene.caution ? [index] : []));
      const own = markingOut.steps[script.steps.indexOf(step)]?.facts.cautions ?? [];
      expect(step.scenes.flatMap((scene) => scene.caution?.id ?? [])).toEqual(own.map(({ id }) => id));
      // The belt's last caution is for the running engine, and comes right before the engine runs.
      if (own.length > 0 && step.key !== "B5") expect(cautions[0]).toBe(0);
    }
  });

  test("has captions that are valid WebVTT inside the film, in order and not overlapping", () => {
    const { cues, problems } = readVtt(readFileSync(mediaPath(key, "captions.vtt"), "utf8"));
    expect(problems).toEqual([]);
    expect(cues.length).toBe(timings.lines.length);
    cues.forEach((cue, index) => {
      expect(cue.startMs).toBeGreaterThanOrEqual(cues[index - 1]?.endMs ?? 0);
      expect(cue.endMs).toBeGreaterThan(cue.startMs);
      expect(cue.endMs).toBeLessThanOrEqual(timings.durationMs);
    });
  });

  test("has a storyboard whose pieces cover the film", () => {
    const { cues, problems } = readVtt(readFileSync(mediaPath(key, "storyboard.vtt"), "utf8"));
    expect(problems).toEqual([]);
    expect(cues[0]?.startMs).toBe(0);
    expect(cues.at(-1)?.endMs).toBe(timings.durationMs);
    for (const { text } of cues) expect(text).toMatch(/^storyboard\.jpg#xywh=\d+,\d+,160,90$/);
  });

  test("draws every scene as well-formed SVG, with its values and the word that they are invented", () => {
    script.steps.forEach((step, index) => {
      for (const scene of step.scenes) {
        for (const ms of [0, 1700, 4300, 60_000]) {
          const svg = frame({ film: script, step, stepNumber: index + 1, scene, since: (line) => ms - line * 2000, doneShare: 0.5 });
          expectWellFormed(svg);
          expect(svg).toContain("Invented demonstration values");
          if (ms === 60_000) for (const plate of scene.lines.flatMap((line) => line.plates ?? [])) if (plate.kind === "value") expect(svg).toContain(`>${plate.value}<`);
        }
      }
    });
  });

  test("has nothing to do with fuel injectors, and names no maker", () => {
    expect(JSON.stringify([script, markingOut])).not.toMatch(/injector|common rail/i);
  });
});

test("the check of well-formedness sees what isn't", () => {
  for (const bad of ["<g><a></g></a>", "<g>", '<g x=1/>', "<text>a & b</text>", '<g x="NaN"/>']) expect(() => expectWellFormed(bad)).toThrow();
});

test("both films together are small enough to be shipped", () => {
  const bytes = DEMO_FILMS.flatMap(({ key }) => MEDIA_FILES.map((file) => statSync(mediaPath(key, file)).size));
  expect(Math.min(...bytes)).toBeGreaterThan(500);
  expect(bytes.reduce((sum, size) => sum + size, 0)).toBeLessThanOrEqual(SIZE_LIMIT_BYTES);
});

test("a value is seen when it is spoken, and not before", () => {
  const script = DEMO_FILMS[0]?.script;
  const step = script?.steps[0];
  if (!script || !step) throw new Error("The demo has a film with a step.");
  const short = { ...script, steps: [{ ...step, scenes: step.scenes.filter(({ picture }) => picture === "limit") }] };
  const { scenes, timings } = layOut(short, [2000, 2000]);
  const drawn = framesOf("Corvane Lume 1.2", scenes, timings.durationMs);
  let ms = 0;
  const seen: number[] = [];
  for (const { svg, frames } of drawn) {
    if (svg.includes(">Disc, limit<")) seen.push(ms);
    ms += frames * 125;
  }
  const spoken = timings.lines[1]?.startMs ?? 0;
  expect(seen[0]).toBeGreaterThanOrEqual(spoken);
  expect(seen[0]).toBeLessThan(spoken + 1000);
  // Frames that look the same are one picture: a standing scene isn't drawn eight times a second.
  expect(drawn.length).toBeLessThan((timings.durationMs / 1000) * 8);
});
