import { Button } from "./button.tsx";

type MoreQuery = {
  readonly hasNextPage: boolean;
  readonly isFetchingNextPage: boolean;
  readonly isFetchNextPageError: boolean;
  readonly fetchNextPage: () => unknown;
};

/** The end of a list that goes on. */
export function ShowMore({ query, what }: { readonly query: MoreQuery; readonly what: string }) {
  if (!query.hasNextPage) return null;
  return (
    <div className="mt-4 space-y-2">
      {query.isFetchNextPageError && (
        <p role="alert" className="text-sm text-oxblood">
          More {what} could not be loaded. Try again.
        </p>
      )}
      <Button busy={query.isFetchingNextPage} onClick={() => void query.fetchNextPage()}>
        Show more {what}
      </Button>
    </div>
  );
}
