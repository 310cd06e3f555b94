/** The grid of a row on a desk: its name, then so many figures. In the hand figures stand in two columns below the name. */
export function columnsOf(figures: number): string {
  if (figures <= 2) return "md:grid-cols-[minmax(0,1fr)_repeat(2,11rem)]";
  if (figures === 3) return "md:grid-cols-[minmax(0,1fr)_repeat(3,10rem)]";
  if (figures === 4) return "md:grid-cols-[minmax(0,1fr)_repeat(4,9.5rem)]";
  return "md:grid-cols-[minmax(0,1fr)_repeat(5,minmax(0,8rem))]";
}
