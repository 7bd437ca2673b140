// Runs before anything is installed, perhaps on an old Node: nothing here or above the import may need a newer one.
const [major, minor] = process.versions.node.split(".").map(Number);
if (major < 20 || (major === 20 && minor < 9)) {
  console.error(`Witnessline needs Node 20.9 or later; this is ${process.versions.node}.`);
  process.exit(1);
}
import("./run-tests.mjs");
