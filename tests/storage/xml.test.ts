import fc from "fast-check";
import { expect, test } from "vitest";
import { Refusal } from "@/storage/fake/refusal";
import { childText, readXml, writeXml } from "@/storage/fake/xml";

test("reads what clients send: declaration, namespace, comment, entities, references", () => {
  const root = readXml(`<?xml version="1.0"?><!-- a list --><Delete xmlns="http://s3.amazonaws.com/doc/2006-03-01/">
    <Object><Key>a&amp;b&#x0A;&#252;&lt;</Key><VersionId/></Object><Quiet>true</Quiet></Delete>`);
  expect(root.name).toBe("Delete");
  expect(childText(root, "Quiet")).toBe("true");
  const [object] = root.children;
  expect(object && childText(object, "Key")).toBe("a&b\nü<");
  expect(object && childText(object, "VersionId")).toBe("");
});

test.each(["", "text", "<a>", "<a></b>", "<a/><b/>", "</a>", "<a><b></a></b>", '<!DOCTYPE a [<!ENTITY x "y">]><a/>', "<a>1 < 2</a>"])(
  "refuses %j",
  (text) => expect(() => readXml(text)).toThrow(Refusal),
);

test("any text comes back as it was written", () => {
  fc.assert(
    fc.property(fc.string({ unit: "binary" }).filter((text) => !text.includes("\u0000")), (text) => {
      const root = readXml(writeXml("Result", { Key: text }));
      expect(childText(root, "Key")).toBe(text);
    }),
  );
});
