import { processRecording } from "@/lib/jobs/process-recording";

// A worker's process with one job, for tests that kill it: the recording's id is the argument.
void processRecording({ recordingId: process.argv[2] });
