/** More pages than a shop has stock or a job has artwork: a list that never ends is a fault of ours. */
const mostPages = 50;

/** A whole list that the server hands out page by page. */
export async function allPages<T>(
  page: (cursor: string | undefined) => Promise<{ items: T[]; next: string | null }>,
): Promise<T[]> {
  const items: T[] = [];
  let cursor: string | undefined;
  for (let count = 0; count < mostPages; count++) {
    const answer = await page(cursor);
    items.push(...answer.items);
    if (answer.next === null) break;
    cursor = answer.next;
  }
  return items;
}
