import { type Control, Controller } from "react-hook-form";
import type { WrittenLimits } from "#shared/dry-fit/check-limits.ts";
import type { DescribedLimit } from "#shared/dry-fit/limit-descriptions.ts";
import { isLength, tidy } from "#shared/dry-fit/limit-units.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { LengthField } from "@/components/ui/length-field.tsx";
import { FigureField } from "./figure-field.tsx";

type LimitFieldProps = {
  readonly limit: DescribedLimit;
  readonly unit: LengthUnit;
  readonly fault: string | undefined;
  readonly control: Control<{ limits: WrittenLimits }, unknown, { limits: Limits }>;
};

/** The shop's figure for one limit, in the unit that the shop reads. */
export function LimitField({ limit, unit, fault, control }: LimitFieldProps) {
  return (
    <Controller
      control={control}
      name={`limits.${limit.key}`}
      render={({ field: { name: _, ...field } }) =>
        isLength(limit.unit) ? (
          <LengthField
            {...field}
            onChange={(mm) => field.onChange(mm === null ? null : tidy(mm))}
            label={limit.label}
            unit={unit}
            fine={limit.unit === "small length"}
            error={fault}
          />
        ) : (
          <FigureField {...field} label={limit.label} unit={limit.unit} error={fault} />
        )
      }
    />
  );
}
