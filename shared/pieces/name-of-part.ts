/** What is left of a piece's name, so that its part can be told after it. */
const longestName = 95;

/** What a part of a piece is called: "Night disc, part 1 of 2". */
export function nameOfPart(name: string, number: number, count: number): string {
  return name === "" ? `Part ${number} of ${count}` : `${name.slice(0, longestName)}, part ${number} of ${count}`;
}
