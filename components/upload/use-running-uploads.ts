"use client";

import { useSyncExternalStore } from "react";
import { currentUploads, noUploads, subscribe, type RunningUpload } from "@/components/upload/running-uploads";

/** The files that this tab is sending to an organisation. */
export function useRunningUploads(org: string): RunningUpload[] {
  return useSyncExternalStore(subscribe, currentUploads, noUploads).filter((upload) => upload.org === org);
}
