import { door } from "@/lib/http/door";
import { exportProgress } from "@/lib/services/cohorts/export-progress";

export const GET = door("GET /orgs/{org}/cohorts/{cohortId}/progress.csv", async ({ actor, params }) => {
  const { fileName, csv } = await exportProgress(actor, params.cohortId);
  return new Response(csv, {
    headers: {
      "content-type": "text/csv; charset=utf-8; header=present",
      "content-disposition": `attachment; filename="${fileName}"`,
      "cache-control": "no-store",
    },
  });
});
