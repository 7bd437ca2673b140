import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

/** What espeak-ng writes: 16-bit mono. */
export const SAMPLE_RATE = 22_050;
const HEADER_BYTES = 44;

/** How the synthesiser must hear what is written: units and abbreviations in full. */
const SPOKEN: [RegExp, string][] = [
  [/N·m/g, "newton metres"],
  [/(\d) mm\b/g, "$1 millimetres"],
  [/(\d) kN\b/g, "$1 kilonewtons"],
  [/(\d) km\/h/g, "$1 kilometres an hour"],
  [/(\d) km\b/g, "$1 kilometres"],
  [/(\d) Hz\b/g, "$1 hertz"],
  [/(\d) V\b/g, "$1 volts"],
  [/±/g, " plus or minus "],
];

/** Speaks a sentence. @returns 16-bit mono samples at SAMPLE_RATE */
export function speak(text: string, voice: { name: string; wordsPerMinute: number }): Int16Array {
  const folder = mkdtempSync(join(tmpdir(), "film-speech-"));
  try {
    const file = join(folder, "line.wav");
    const words = SPOKEN.reduce((spoken, [written, heard]) => spoken.replace(written, heard), text);
    execFileSync("espeak-ng", ["-v", voice.name, "-s", String(voice.wordsPerMinute), "-w", file, words]);
    const bytes = readFileSync(file);
    const samples = new Int16Array((bytes.length - HEADER_BYTES) >> 1);
    for (let index = 0; index < samples.length; index += 1) samples[index] = bytes.readInt16LE(HEADER_BYTES + index * 2);
    return samples;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Samples as a WAV file. */
export function wav(samples: Int16Array): Buffer {
  const bytes = Buffer.alloc(HEADER_BYTES + samples.length * 2);
  bytes.write("RIFF", 0, "ascii");
  bytes.writeUInt32LE(bytes.length - 8, 4);
  bytes.write("WAVEfmt ", 8, "ascii");
  bytes.writeUInt32LE(16, 16);
  bytes.writeUInt16LE(1, 20);
  bytes.writeUInt16LE(1, 22);
  bytes.writeUInt32LE(SAMPLE_RATE, 24);
  bytes.writeUInt32LE(SAMPLE_RATE * 2, 28);
  bytes.writeUInt16LE(2, 32);
  bytes.writeUInt16LE(16, 34);
  bytes.write("data", 36, "ascii");
  bytes.writeUInt32LE(samples.length * 2, 40);
  samples.forEach((sample, index) => bytes.writeInt16LE(sample, HEADER_BYTES + index * 2));
  return bytes;
}
