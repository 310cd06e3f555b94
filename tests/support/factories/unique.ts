let count = 0;

/** A number that no other record of this test file has. */
export const unique = (): number => {
  count += 1;
  return count;
};
