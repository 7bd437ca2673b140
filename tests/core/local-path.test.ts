import { expect, test } from "vitest";
import { localPath } from "@/lib/core/local-path";

test.each(["/", "/o/quay/today", "/o/quay/modules/1?as=mentor", "/join#abc_-1", "/a%20b"])("%s leads to a page of ours", (path) => {
  expect(localPath(path)).toBe(path);
});

// How a browser reads an address: WHATWG URL, "relative slash state" takes "\" for "/" and drops tabs and line ends (https://url.spec.whatwg.org/).
test.each([
  "https://elsewhere.example/",
  "//elsewhere.example",
  "/\\elsewhere.example",
  "\\/elsewhere.example",
  "/\t/elsewhere.example",
  "/\n/elsewhere.example",
  " /o",
  "javascript:alert(1)",
  "o/quay",
  "/..//elsewhere.example",
  "/.//elsewhere.example",
  "/api/auth/signout",
  "/o/../api/v1/openapi.json",
  "",
  undefined,
  ["/o", "/p"],
  `/${"a".repeat(3000)}`,
])("%j leads nowhere", (address) => {
  expect(localPath(address)).toBeUndefined();
});
