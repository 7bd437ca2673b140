/** A WebVTT file to keep. @param fileName plain letters only */
export function vttFile(text: string, fileName: string): Response {
  return new Response(text, {
    headers: {
      "content-type": "text/vtt; charset=utf-8",
      "content-disposition": `attachment; filename="${fileName}"`,
      "cache-control": "no-store",
    },
  });
}
