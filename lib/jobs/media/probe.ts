import { z } from "zod";
import { formatClock } from "@/lib/core/webvtt/timestamps";
import { MediaFault } from "@/lib/jobs/media/media-fault";
import { MOST_POINTS, readingOptions } from "@/lib/jobs/media/reading";
import { runProgram } from "@/lib/jobs/media/run-program";

/** What is known of a film. Width and height are as shown: upright, with square points. */
export type FilmFacts = {
  durationMs: number;
  width: number;
  height: number;
  videoIndex: number;
  audioIndex: number | null;
  framesPerSecond: number;
};

const seconds = z.coerce.number().positive().optional().catch(undefined);
const streamSchema = z.object({
  index: z.int(),
  codec_type: z.string().optional(),
  codec_name: z.string().optional(),
  width: z.int().optional(),
  height: z.int().optional(),
  sample_aspect_ratio: z.string().optional(),
  avg_frame_rate: z.string().optional(),
  nb_frames: z.coerce.number().optional().catch(undefined),
  duration: seconds,
  disposition: z.object({ attached_pic: z.int().optional() }).optional(),
  side_data_list: z.array(z.object({ rotation: z.number().optional() })).optional(),
});
const probeSchema = z.object({ streams: z.array(streamSchema), format: z.object({ duration: seconds }).optional() });
type Stream = z.infer<typeof streamSchema>;

const ENTRIES =
  "format=duration:stream=index,codec_type,codec_name,width,height,sample_aspect_ratio,avg_frame_rate,nb_frames,duration" +
  ":stream_disposition=attached_pic:stream_side_data=rotation";
const PROBE_SECONDS = 120;
const SHORTEST_MS = 500;

/**
 * Finds out what a file holds.
 * @param limitMs  the longest film that is taken
 * @throws MediaFault with the reason if it is no film, or none that can be taken
 */
export async function probeFilm(path: string, limitMs: number, signal: AbortSignal): Promise<FilmFacts> {
  const { streams, format } = await readStreams(path, signal);
  const video = streams.find((stream) => stream.codec_type === "video" && stream.disposition?.attached_pic !== 1);
  if (!video) {
    throw new MediaFault(
      streams.some((stream) => stream.codec_type === "audio") ? "The file holds sound and no picture. Add the film itself." : "The file holds no picture.",
    );
  }
  const size = shownSize(video);
  const durationMs = Math.round((video.duration ?? format?.duration ?? (await measure(path, video.index, signal))) * 1000);
  if (durationMs < SHORTEST_MS || video.nb_frames === 1) throw new MediaFault("The file holds a single picture, not a film.");
  if (durationMs > limitMs) {
    throw new MediaFault(`The film lasts ${formatClock(durationMs)}; at most ${formatClock(limitMs)} can be taken. Cut it into parts and add those.`);
  }
  const audio = streams.find((stream) => stream.codec_type === "audio" && (stream.codec_name ?? "none") !== "none");
  return { ...size, durationMs, videoIndex: video.index, audioIndex: audio?.index ?? null, framesPerSecond: ratio(video.avg_frame_rate) ?? 0 };
}

async function readStreams(path: string, signal: AbortSignal): Promise<z.infer<typeof probeSchema>> {
  const args = ["-v", "error", "-of", "json", "-show_entries", ENTRIES, ...readingOptions(path)];
  try {
    return probeSchema.parse(JSON.parse(await runProgram("ffprobe", args, { seconds: PROBE_SECONDS, fileBytes: 0, signal })));
  } catch (error) {
    if (!(error instanceof MediaFault)) throw error;
    throw new MediaFault(
      "The file is not a film that can be read, whatever it is called. Add it as the phone or camera saved it: MP4, MOV, MKV, WebM, AVI or MPEG.",
      error.log,
    );
  }
}

function shownSize(video: Stream): { width: number; height: number } {
  const { width, height } = video;
  if (!width || !height) throw new MediaFault("The film’s picture can’t be read. Add it as the phone or camera saved it.");
  if (width * height > MOST_POINTS) throw new MediaFault(`The film claims a picture of ${width} × ${height} points, more than any camera takes. It was refused.`);
  const aspect = ratio(video.sample_aspect_ratio?.replace(":", "/")) ?? 1;
  const square = aspect > 0.1 && aspect < 10 ? Math.round(width * aspect) : width;
  const rotation = video.side_data_list?.find((data) => data.rotation !== undefined)?.rotation ?? 0;
  return Math.abs(Math.round(rotation / 90)) % 2 === 1 ? { width: height, height: square } : { width: square, height };
}

/** "30000/1001" as a number, or undefined where nothing is said. */
function ratio(text: string | undefined): number | undefined {
  const [over, under] = (text ?? "").split("/").map(Number);
  return over && under ? over / under : undefined;
}

/** Length in seconds of a film whose container doesn't tell, as browsers record them: by reading it through without decoding. */
async function measure(path: string, videoIndex: number, signal: AbortSignal): Promise<number> {
  let microseconds = 0;
  const args = ["-nostdin", "-v", "error", ...readingOptions(path), "-map", `0:${videoIndex}`, "-c", "copy", "-progress", "pipe:1", "-f", "null", "-"];
  await runProgram("ffmpeg", args, {
    seconds: PROBE_SECONDS * 5,
    fileBytes: 0,
    signal,
    onLine: (line) => (microseconds = progressMicroseconds(line) ?? microseconds),
  });
  return microseconds / 1_000_000;
}

/** How far a line of ffmpeg's `-progress` says it has come; other lines say nothing of it. */
export function progressMicroseconds(line: string): number | undefined {
  const match = /^out_time_us=(\d+)$/.exec(line.trim());
  return match ? Number(match[1]) : undefined;
}
