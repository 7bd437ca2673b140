/** Containers in which phones, cameras and screen recorders keep a film. Lists, playlists and pictures are none. */
const FORMATS = ["mov", "mp4", "m4a", "3gp", "3g2", "mj2", "matroska", "webm", "avi", "mpegts", "mpeg"];

/** Decoders for what stands in them. No decoder of still pictures but Motion JPEG. */
const DECODERS = [
  "h264", "hevc", "mpeg4", "msmpeg4v3", "mpeg1video", "mpeg2video", "h263", "vp8", "vp9", "libdav1d", "av1", "mjpeg", "prores", "dvvideo",
  "aac", "mp3", "mp3float", "mp2", "mp2float", "opus", "libopus", "vorbis", "ac3", "eac3", "flac", "alac", "amrnb", "amrwb",
  "pcm_s16le", "pcm_s16be", "pcm_s24le", "pcm_s24be", "pcm_s32le", "pcm_f32le", "pcm_u8", "pcm_mulaw", "pcm_alaw",
  "adpcm_ima_qt", "adpcm_ima_wav", "adpcm_ms",
];

/** More than any camera's frame: 8K has 33 million points. */
export const MOST_POINTS = 40_000_000;

/**
 * Options for reading a file that a stranger may have made: from this disk only, as a film only. Without the list of formats a text
 * file that names others would be opened as a playlist, and the files that it names with it.
 */
export const readingOptions = (path: string): string[] => [
  "-protocol_whitelist", "file",
  "-format_whitelist", FORMATS.join(","),
  "-codec_whitelist", DECODERS.join(","),
  "-max_pixels", String(MOST_POINTS),
  "-i", `file:${path}`,
];
