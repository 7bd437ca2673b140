import { bytesToHex, hexToBytes, sha256Bytes, utf8ToBytes } from "@/lib/core/ledger/bytes";

/** Hash trees of RFC 6962, section 2.1. Hashes are 64 hex digits outside and bytes within. */
const LEAF = new Uint8Array([0]);
const NODE = new Uint8Array([1]);

/** Hash of one leaf: SHA-256(0x00 ‖ data). @param data text (its UTF-8 bytes) or bytes */
export function leafHash(data: string | Uint8Array): string {
  return bytesToHex(sha256Bytes(LEAF, typeof data === "string" ? utf8ToBytes(data) : data));
}

const join = (left: Uint8Array, right: Uint8Array): Uint8Array => sha256Bytes(NODE, left, right);

/** The largest power of two smaller than n. */
function splitPoint(n: number): number {
  let k = 1;
  while (k * 2 < n) k *= 2;
  return k;
}

/** Exact for every safe integer, as a rounded logarithm is not. */
const isPowerOfTwo = (n: number): boolean => 2 ** Math.round(Math.log2(n)) === n;

function rootOf(leaves: Uint8Array[]): Uint8Array {
  const [only] = leaves;
  if (only === undefined) return sha256Bytes();
  if (leaves.length === 1) return only;
  const k = splitPoint(leaves.length);
  return join(rootOf(leaves.slice(0, k)), rootOf(leaves.slice(k)));
}

/** Root of the tree over these leaf hashes, in order. The empty tree's root is SHA-256 of nothing. */
export function treeRoot(leafHashes: string[]): string {
  return bytesToHex(rootOf(leafHashes.map(hexToBytes)));
}

function pathOf(index: number, leaves: Uint8Array[]): Uint8Array[] {
  if (leaves.length <= 1) return [];
  const k = splitPoint(leaves.length);
  const [left, right] = [leaves.slice(0, k), leaves.slice(k)];
  return index < k ? [...pathOf(index, left), rootOf(right)] : [...pathOf(index - k, right), rootOf(left)];
}

/** The audit path that shows leaf `index` to be in the tree, nearest hash first. */
export function inclusionProof(index: number, leafHashes: string[]): string[] {
  if (!Number.isInteger(index) || index < 0 || index >= leafHashes.length) throw new RangeError("There is no such leaf.");
  return pathOf(index, leafHashes.map(hexToBytes)).map(bytesToHex);
}

const isHash = (hex: string): boolean => /^[0-9a-f]{64}$/.test(hex);

/** Whether `proof` shows that `leaf` is leaf `index` of the tree of `size` leaves with this root. RFC 9162, section 2.1.3.2. */
export function verifyInclusion(of: { index: number; size: number; leaf: string; proof: string[]; root: string }): boolean {
  const { index, size, leaf, proof, root } = of;
  if (!Number.isSafeInteger(index) || !Number.isSafeInteger(size) || index < 0 || index >= size) return false;
  if (![leaf, root, ...proof].every(isHash)) return false;
  let node = index;
  let last = size - 1;
  let hash: Uint8Array = hexToBytes(leaf);
  for (const step of proof.map(hexToBytes)) {
    if (last === 0) return false;
    if (node % 2 === 1 || node === last) {
      hash = join(step, hash);
      while (node % 2 === 0 && node !== 0) [node, last] = [Math.floor(node / 2), Math.floor(last / 2)];
    } else {
      hash = join(hash, step);
    }
    [node, last] = [Math.floor(node / 2), Math.floor(last / 2)];
  }
  return last === 0 && bytesToHex(hash) === root;
}

function subProof(m: number, leaves: Uint8Array[], whole: boolean): Uint8Array[] {
  const n = leaves.length;
  if (m === n) return whole ? [] : [rootOf(leaves)];
  const k = splitPoint(n);
  const [left, right] = [leaves.slice(0, k), leaves.slice(k)];
  return m <= k ? [...subProof(m, left, whole), rootOf(right)] : [...subProof(m - k, right, false), rootOf(left)];
}

/** What shows that the tree of the first `size` leaves is the beginning of the whole one. */
export function consistencyProof(size: number, leafHashes: string[]): string[] {
  if (!Number.isInteger(size) || size < 1 || size > leafHashes.length) throw new RangeError("There is no such tree.");
  return subProof(size, leafHashes.map(hexToBytes), true).map(bytesToHex);
}

/**
 * Whether `proof` shows that the tree of `size2` leaves only added to that of `size1`. RFC 9162, section 2.1.4.2; an empty first tree is
 * refused, since everything is consistent with it.
 */
export function verifyConsistency(of: { size1: number; size2: number; root1: string; root2: string; proof: string[] }): boolean {
  const { size1, size2, root1, root2, proof } = of;
  if (!Number.isSafeInteger(size1) || !Number.isSafeInteger(size2) || size1 < 1 || size2 < size1) return false;
  if (size1 === size2) return proof.length === 0 && root1 === root2;
  if (![root1, root2, ...proof].every(isHash)) return false;
  const [seed, ...rest] = (isPowerOfTwo(size1) ? [root1, ...proof] : proof).map(hexToBytes);
  if (seed === undefined) return false;
  let node = size1 - 1;
  let last = size2 - 1;
  while (node % 2 === 1) [node, last] = [Math.floor(node / 2), Math.floor(last / 2)];
  let first: Uint8Array = seed;
  let second: Uint8Array = seed;
  for (const step of rest) {
    if (last === 0) return false;
    if (node % 2 === 1 || node === last) {
      first = join(step, first);
      second = join(step, second);
      while (node % 2 === 0 && node !== 0) [node, last] = [Math.floor(node / 2), Math.floor(last / 2)];
    } else {
      second = join(second, step);
    }
    [node, last] = [Math.floor(node / 2), Math.floor(last / 2)];
  }
  return last === 0 && bytesToHex(first) === root1 && bytesToHex(second) === root2;
}
