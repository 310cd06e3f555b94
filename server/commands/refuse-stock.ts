import { UniqueConstraintError } from "sequelize";
import type { StockKind } from "#shared/contracts/stock-entry.ts";
import { AppError, notAllowed, notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { stockPolicy } from "../policies/stock.ts";

/** Refuses whoever may not see the stock, or may not change it. */
export function refuseStock({ actor }: Pick<Context, "actor">): void {
  if (!stockPolicy.see(actor)) throw notFound("stock");
  if (!stockPolicy.change(actor)) throw notAllowed("The stock is kept by owners and makers.");
}

/** Writes a row; one whose name is in stock already is refused in words. */
export async function withFreeName<T>(
  { kind, name }: { kind: StockKind; name: string },
  write: Promise<T>,
): Promise<T> {
  return write.catch((error: unknown) => {
    if (!(error instanceof UniqueConstraintError)) throw error;
    const detail = `${name} is in stock already. Change that one, or take another name.`;
    throw new AppError("already_exists", { detail, errors: [{ pointer: `/entry/${kind}/name`, detail }] });
  });
}
