import { existsSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { faceOf, faces, nameOfFace } from "#shared/lettering/faces.ts";

const root = new URL("../../../../", import.meta.url);
const read = (path: string) => readFileSync(new URL(path, root), "utf8");
const shipped = read("public/font-licences.txt");
const styles = read("src/features/mockup/panels/lettering-faces.css");
const served = read("src/features/mockup/engine/face-files.ts");

describe.each(faces)("the face $key", (face) => {
  it("is a file of its package, under the licence that the package names", () => {
    expect(existsSync(new URL(`node_modules/${face.package}/${face.file}`, root))).toBe(true);
    const { license } = z
      .object({ license: z.string() })
      .parse(JSON.parse(read(`node_modules/${face.package}/package.json`)));
    expect(face.licence).toBe(license);
    expect(face.licence).toBe("OFL-1.1");
  });

  it("has its licence's text, which speaks of that licence, shipped to the letter", () => {
    const text = read(`node_modules/${face.package}/LICENSE`).trimEnd();
    expect(text).toContain("SIL OPEN FONT LICENSE Version 1.1");
    expect(shipped).toContain(text);
    expect(shipped).toContain(`- ${face.family}\n`);
  });

  it("is served for setting and shown in its own letters", () => {
    expect(served).toContain(`"${face.package}/${face.file}?url"`);
    expect(served).toContain(`["${face.key}", `);
    expect(styles).toContain(`@import "${face.package}/latin-${face.cssWeight}.css";`);
    expect(styles).toMatch(
      new RegExp(
        `\\.face-${face.key} \\{\\s+font-family: "${face.family}", [a-z-]+;\\s+font-weight: ${face.cssWeight};`,
      ),
    );
  });

  it("has a key that a document takes", () => {
    expect(face.key).toMatch(/^[a-z][a-z0-9-]{0,59}$/);
    expect(faceOf(face.key)).toBe(face);
  });
});

it("there are at least six families, and no key or name is used twice", () => {
  expect(new Set(faces.map(({ family }) => family)).size).toBeGreaterThanOrEqual(6);
  expect(new Set(faces.map(({ key }) => key)).size).toBe(faces.length);
  expect(new Set(faces.map(nameOfFace)).size).toBe(faces.length);
});

it("a key that no face has finds none", () => {
  expect(faceOf("montserrat-601")).toBeNull();
});
