import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, expect, test, vi } from "vitest";
import { hashSources } from "@/lib/cli/build.mjs";
import { clusterFolder } from "@/lib/cli/cluster-home.mjs";
import { findServer, isForeignCluster } from "@/lib/cli/cluster-files.mjs";
import { howToInstall } from "@/lib/cli/debian.mjs";
import { judgeDisk } from "@/lib/cli/disk.mjs";
import { readWishedPort, readWords } from "@/lib/cli/options.mjs";
import { arePackagesInstalled } from "@/lib/cli/packages.mjs";
import { findPostgres } from "@/lib/cli/programs.mjs";
import { readSecrets } from "@/lib/cli/secrets.mjs";
import { stage } from "@/lib/cli/stages.mjs";
import { describeFailure, Told } from "@/lib/cli/told.mjs";

const folder = () => mkdtempSync(join(tmpdir(), "stages-"));
afterEach(() => vi.unstubAllEnvs());

test("a stage is one line with its outcome and time; a failing one says so and fails", async () => {
  let text = "";
  const out = { write: (part: string) => (text += part) };
  await stage("PostgreSQL", () => "started", out);
  await expect(stage("Build", () => Promise.reject(new Error("no")), out)).rejects.toThrow("no");
  expect(text).toMatch(/^ {2}PostgreSQL +started \(\d+\.\d s\)\n {2}Build +failed \(\d+\.\d s\)\n$/);
});

const lock = { packages: { "": {}, "node_modules/a": { version: "1.0.0" }, "node_modules/os-only": { version: "1.0.0", optional: true } } };

test.each([
  ["nothing installed yet, or an installation that was cut off", undefined, false],
  ["another version", { packages: { "node_modules/a": { version: "0.9.0" } } }, false],
  ["one is missing", { packages: {} }, false],
  ["all but what other systems need", { packages: { "node_modules/a": { version: "1.0.0" } } }, true],
])("npm packages: %s", (_, installed, expected) => {
  expect(arePackagesInstalled(lock, installed)).toBe(expected);
});

test("Debian packages: apt as root, by sudo without a password, and else one line to run", () => {
  const machine = { hasApt: true, isRoot: false, maySudo: false };
  expect(howToInstall(["ffmpeg"], { ...machine, isRoot: true })).toEqual({ prefix: [] });
  expect(howToInstall(["ffmpeg"], { ...machine, maySudo: true })).toEqual({ prefix: ["sudo", "-n"] });
  expect(howToInstall(["postgresql", "ffmpeg"], machine).ask).toContain("sudo apt-get update && sudo apt-get install -y --no-install-recommends postgresql ffmpeg");
  expect(howToInstall(["ffmpeg"], { hasApt: false, isRoot: true, maySudo: false }).ask).toContain("no apt-get");
});

test("too little room on the disk is told with both figures", () => {
  expect(judgeDisk({ bavail: 2 * 1024 ** 2, bsize: 1024 }, "/here")).toBe("2 GB free");
  expect(() => judgeDisk({ bavail: 1024 ** 2, bsize: 1024 }, "/here")).toThrow("Only 1.0 GB are free where /here lies; Witnessline needs 1.5 GB.");
});

test("the newest PostgreSQL from 15 on is taken; an older one is none", () => {
  const base = folder();
  vi.stubEnv("PATH", "");
  const install = (version: string) => {
    mkdirSync(join(base, version, "bin"), { recursive: true });
    for (const name of ["initdb", "pg_ctl", "psql"]) writeFileSync(join(base, version, "bin", name), "", { mode: 0o755 });
  };
  install("13");
  expect(findPostgres(base)).toBeUndefined();
  install("15");
  install("9"); // sorted as text it would come after 15
  expect(findPostgres(base)).toBe(join(base, "15/bin"));
});

test("root's cluster lies outside the clone under a short name of its own; everybody else's in the data folder", () => {
  expect(clusterFolder("/home/asha/clone/.data", false)).toBe("/home/asha/clone/.data/postgres");
  expect(clusterFolder("/srv/one/.data", true)).toMatch(/^\/var\/lib\/witnessline\/[0-9a-f]{12}$/);
  expect(clusterFolder("/srv/one/.data", true)).not.toBe(clusterFolder("/srv/two/.data", true));
});

test("a cluster is known by its data folder's instance", () => {
  const cluster = folder();
  expect(isForeignCluster(join(cluster, "none"), "abc")).toBe(false);
  expect(isForeignCluster(cluster, "abc")).toBe(true); // cut off before it was marked
  writeFileSync(join(cluster, "instance"), "abc");
  expect(isForeignCluster(cluster, "abc")).toBe(false);
  expect(isForeignCluster(cluster, "abd")).toBe(true);
});

test("a pid file is no server when its process is another program", () => {
  const cluster = folder();
  mkdirSync(join(cluster, "data"));
  expect(findServer(cluster)).toBeUndefined();
  writeFileSync(join(cluster, "data/postmaster.pid"), `${process.pid}\n${join(cluster, "data")}\n0\n4204\n`);
  expect(findServer(cluster)).toBeUndefined();
});

test("secrets are made once, differ from each other and stay", () => {
  const data = folder();
  const first = readSecrets(data);
  expect(readSecrets(data)).toEqual(first);
  expect(new Set(Object.values(first)).size).toBe(Object.keys(first).length);
});

test("the build is seen as stale when a source changes, and only then", () => {
  const root = folder();
  mkdirSync(join(root, "app"));
  mkdirSync(join(root, "lib/cli"), { recursive: true });
  writeFileSync(join(root, "app/page.tsx"), "one");
  writeFileSync(join(root, "package.json"), "{}");
  const before = hashSources(root);
  writeFileSync(join(root, "lib/cli/start.mjs"), "a command");
  writeFileSync(join(root, "next-env.d.ts"), "written by the framework");
  expect(hashSources(root)).toBe(before);
  writeFileSync(join(root, "app/page.tsx"), "two");
  const changed = hashSources(root);
  expect(changed).not.toBe(before);
  rmSync(join(root, "app/page.tsx"));
  writeFileSync(join(root, "app/other.tsx"), "two");
  expect(new Set([before, changed, hashSources(root)]).size).toBe(3);
});

test("words and ports from the command line are checked", () => {
  expect(readWords(["unit", "types"], ["types", "unit"])).toEqual(new Set(["types", "unit"]));
  expect(() => readWords(["untis"], ["types", "unit"])).toThrow('"untis" is not known here. Known: types, unit.');
  expect(readWishedPort(undefined)).toBeUndefined();
  expect(readWishedPort("8080")).toBe(8080);
  expect(() => readWishedPort("eighty")).toThrow("it must be a number from 1 to 65535");
});

test("a refusal of the system is told with what to do; a bug of ours keeps its stack", () => {
  const full = Object.assign(new Error("ENOSPC: no space left on device, write"), { code: "ENOSPC" });
  expect(describeFailure(full)).toBe("\nENOSPC: no space left on device, write\nThe disk is full. Make room and start again.");
  expect(describeFailure(new Told("Port 4200 is taken."))).toBe("\nPort 4200 is taken.");
  const bug = new TypeError("undefined is not a function");
  expect(describeFailure(bug)).toBe(bug);
});
