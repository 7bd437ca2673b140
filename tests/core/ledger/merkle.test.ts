import { readFileSync } from "node:fs";
import fc from "fast-check";
import { expect, test } from "vitest";
import { consistencyProof, inclusionProof, leafHash, treeRoot, verifyConsistency, verifyInclusion } from "@/lib/core/ledger/merkle";

type Inclusion = { leafIndex: number; treeSize: number; leafHash: string; root: string; proof: string[] };
type Consistency = { size1: number; size2: number; root1: string; root2: string; proof: string[] };
const read = (file: string): unknown => JSON.parse(readFileSync(`tests/core/vectors/ledger/${file}`, "utf8"));
const tree = read("merkle-rfc6962.json") as {
  leavesHex: string[];
  rootsBySize: string[];
  levels: string[][];
  inclusion: Inclusion[];
  consistency: Consistency[];
};
const leaves = tree.leavesHex.map((hex) => leafHash(Buffer.from(hex, "hex")));

// Source of all trees and proofs here: tests/core/vectors/ledger/SOURCE.md (RFC 6962, 2.1; the reference tests of certificate logs).
test("hashes leaves and nodes of every level as published", () => {
  expect(leaves).toEqual(tree.levels[0]);
  tree.levels.forEach((level, height) => {
    const width = 2 ** height;
    expect(level.map((_, at) => treeRoot(leaves.slice(at * width, (at + 1) * width)))).toEqual(level);
  });
});

test.each(tree.rootsBySize.map((root, size) => ({ size, root })))("root of the first $size leaves", ({ size, root }) => {
  expect(treeRoot(leaves.slice(0, size))).toBe(root);
});

test.each(tree.inclusion)("leaf $leafIndex of $treeSize: proof as published, and it holds", ({ leafIndex, treeSize, leafHash: leaf, root, proof }) => {
  expect(inclusionProof(leafIndex, leaves.slice(0, treeSize))).toEqual(proof);
  expect(verifyInclusion({ index: leafIndex, size: treeSize, leaf, proof, root })).toBe(true);
});

test.each(tree.consistency)("from $size1 to $size2 leaves: proof as published, and it holds", ({ size1, size2, root1, root2, proof }) => {
  expect(consistencyProof(size1, leaves.slice(0, size2))).toEqual(proof);
  expect(verifyConsistency({ size1, size2, root1, root2, proof })).toBe(true);
});

type Case = { desc: string; file: string; wantErr: boolean; proof: string[] | null };
const published = read("merkle-proof-cases.json") as {
  inclusion: (Case & { leafIdx: number; treeSize: number; root: string; leafHash: string })[];
  consistency: (Case & { size1: number; size2: number; root1: string; root2: string })[];
};
const hex = (base64: string): string => Buffer.from(base64 ?? "", "base64").toString("hex");

test("all 196 published proof cases are there, 184 of them to be refused", () => {
  const cases: Case[] = [...published.inclusion, ...published.consistency];
  expect(cases).toHaveLength(196);
  expect(cases.filter((each) => each.wantErr)).toHaveLength(184);
});

test.each(published.inclusion)("$file: refused $wantErr", ({ leafIdx, treeSize, root, leafHash: leaf, proof, wantErr }) => {
  const of = { index: leafIdx, size: treeSize, leaf: hex(leaf), root: hex(root), proof: (proof ?? []).map(hex) };
  expect(verifyInclusion(of)).toBe(!wantErr);
});

test.each(published.consistency)("$file: refused $wantErr", ({ size1, size2, root1, root2, proof, wantErr }) => {
  const of = { size1, size2, root1: hex(root1), root2: hex(root2), proof: (proof ?? []).map(hex) };
  expect(verifyConsistency(of)).toBe(!wantErr);
});

const row = fc.string().map((text) => leafHash(text));
const rows = fc.uniqueArray(row, { minLength: 1, maxLength: 70 });

test("in a tree of any size every leaf can be shown, at its own place and nowhere else", () => {
  fc.assert(
    fc.property(rows, fc.nat(), fc.nat(), (leaves, a, b) => {
      const [index, other] = [a % leaves.length, b % leaves.length];
      const of = { index, size: leaves.length, leaf: leaves[index] ?? "", proof: inclusionProof(index, leaves), root: treeRoot(leaves) };
      expect(verifyInclusion(of)).toBe(true);
      if (other !== index) {
        expect(verifyInclusion({ ...of, index: other })).toBe(false);
        expect(verifyInclusion({ ...of, leaf: leaves[other] ?? "" })).toBe(false);
      }
    }),
  );
});

test("an altered, missing, swapped or extra row changes the root, and no proof joins it to the old one", () => {
  fc.assert(
    fc.property(rows, row, fc.nat(), (leaves, stranger, at) => {
      const index = at % leaves.length;
      const next = (index + 1) % leaves.length;
      fc.pre(!leaves.includes(stranger));
      const root = treeRoot(leaves);
      const swapped = leaves.with(index, leaves[next] ?? "").with(next, leaves[index] ?? "");
      const tampered = [leaves.with(index, stranger), leaves.toSpliced(index, 1), leaves.toSpliced(index, 0, stranger), ...(leaves.length > 1 ? [swapped] : [])];
      for (const other of tampered) expect(treeRoot(other)).not.toBe(root);

      const grown = [...leaves, stranger];
      const of = { size1: leaves.length, size2: grown.length, root1: root, root2: treeRoot(grown), proof: consistencyProof(leaves.length, grown) };
      expect(verifyConsistency(of)).toBe(true);
      const altered = [...leaves.with(index, stranger), stranger];
      const forged = { ...of, root2: treeRoot(altered), proof: consistencyProof(leaves.length, altered) };
      expect(verifyConsistency(forged)).toBe(false);
    }),
  );
});

test("a tree only ever grows: every earlier size is shown to be its beginning", () => {
  fc.assert(
    fc.property(rows, fc.nat(), (leaves, at) => {
      const size1 = 1 + (at % leaves.length);
      const of = { size1, size2: leaves.length, root1: treeRoot(leaves.slice(0, size1)), root2: treeRoot(leaves), proof: consistencyProof(size1, leaves) };
      expect(verifyConsistency(of)).toBe(true);
    }),
  );
});

// Source: RFC 9162, 2.1.3.2 and 2.1.4.2, "if sn is 0, then stop … and fail": a path longer than the tree is deep proves nothing.
test("a larger tree's path is not taken for a smaller tree's", () => {
  const [first = "", second = ""] = leaves;
  const two = treeRoot([first, second]);
  expect(verifyInclusion({ index: 0, size: 1, leaf: second, proof: [first], root: two })).toBe(false);
  // From 7 to 8 leaves is from 3 to 4 on the right, and one hash more.
  const grown = { size1: 7, size2: 8, root1: treeRoot(leaves.slice(0, 7)), root2: treeRoot(leaves), proof: consistencyProof(7, leaves) };
  expect(verifyConsistency(grown)).toBe(true);
  expect(verifyConsistency({ ...grown, size1: 3, size2: 4 })).toBe(false);
});

test("there is no proof for a leaf or a size that isn't there", () => {
  const eight = leaves.slice(0, 8);
  for (const index of [-1, 8, 0.5, Number.NaN]) expect(() => inclusionProof(index, eight)).toThrow(RangeError);
  for (const size of [0, 9, 1.5]) expect(() => consistencyProof(size, eight)).toThrow(RangeError);
});

// 2^53 − 1 is no power of two, though its binary logarithm rounds to 53: the first hash must come from the proof.
test("sizes near the largest integer are neither mistaken nor endless", () => {
  const hash = leafHash("");
  const of = { size1: Number.MAX_SAFE_INTEGER - 1, size2: Number.MAX_SAFE_INTEGER, root1: hash, root2: hash, proof: [hash] };
  expect(verifyConsistency(of)).toBe(false);
});
