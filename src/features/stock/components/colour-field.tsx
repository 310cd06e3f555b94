import { controlClass, FieldFrame, typedClass } from "@/components/ui/field-frame.tsx";
import { cx } from "@/lib/cx.ts";

/** A colour by eye or by its six digits. */
export function ColourField({
  label,
  value,
  onChange,
  hint,
  error,
}: {
  readonly label: string;
  readonly value: string;
  readonly onChange: (colour: string) => void;
  readonly hint?: string;
  readonly error: string | undefined;
}) {
  const readable = /^#[0-9a-f]{6}$/i.test(value.trim());
  return (
    <FieldFrame label={label} {...(hint ? { hint } : {})} error={error}>
      {(ties) => (
        <span className="flex items-stretch gap-2">
          <input
            type="color"
            aria-label={`${label}, by eye`}
            value={readable ? value.trim().toLowerCase() : "#808080"}
            onChange={(event) => onChange(event.target.value.toUpperCase())}
            className="h-11 w-14 shrink-0 cursor-pointer rounded border border-graphite bg-sheet p-1"
          />
          <input
            {...ties}
            value={value}
            onChange={(event) => onChange(event.target.value)}
            autoComplete="off"
            spellCheck={false}
            className={cx(controlClass, typedClass, "font-sans tabular-nums uppercase")}
          />
        </span>
      )}
    </FieldFrame>
  );
}
