import { execFile } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { readFile, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { promisify } from "node:util";
import { afterAll } from "vitest";

const run = promisify(execFile);

/** Small films made on the spot by ffmpeg's own test pictures: nobody's work, nothing to keep. */
export function testClips() {
  const folder = mkdtempSync(join(tmpdir(), "clips-"));
  afterAll(() => rmSync(folder, { recursive: true, force: true }));
  const ffmpeg = (...args: string[]) => run("ffmpeg", ["-v", "error", "-y", ...args]);
  const path = (name: string) => join(folder, name);

  return {
    path,
    ffmpeg,

    /** A film of so many seconds; `args` are added for the output. */
    async film(name: string, { size = "640x360", seconds = 2, rate = 25, sound = true, args = [] as string[] } = {}): Promise<Buffer> {
      const inputs = ["-f", "lavfi", "-i", `testsrc2=s=${size}:r=${rate}:d=${seconds}`];
      const tone = sound ? ["-f", "lavfi", "-i", `sine=d=${seconds}`, "-c:a", "aac", "-shortest"] : [];
      await ffmpeg(...inputs, ...tone, "-c:v", "libx264", "-preset", "ultrafast", "-pix_fmt", "yuv420p", ...args, path(name));
      return readFile(path(name));
    },

    async write(name: string, bytes: Buffer | string): Promise<string> {
      await writeFile(path(name), bytes);
      return path(name);
    },

    /** What ffprobe says of a file, by its own words. */
    async probe(file: string): Promise<{ streams: Record<string, never>[]; format: Record<string, never> }> {
      const { stdout } = await run("ffprobe", ["-v", "error", "-of", "json", "-show_streams", "-show_format", file]);
      return JSON.parse(stdout);
    },
  };
}
