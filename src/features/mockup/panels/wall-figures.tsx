import { useMemo } from "react";
import type { WallPhoto } from "#shared/mockup/document.ts";
import { isDoubtful, readWallPhoto } from "#shared/wall/read-wall-photo.ts";
import { LengthField } from "@/components/ui/length-field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { hangAt, isUnmarked, markCorner, setSheet } from "../model/commands/set-wall.ts";
import { depthWords, errorWords, placeOnWallWords, residualWords } from "../model/wall-words.ts";
import { cornerNames } from "./corner-mark.tsx";
import type { WallStep } from "./wall-form.tsx";

/** The sheet, its marks and the sign's place in figures, and how true the picture is. */
export function WallFigures({ photo, step }: { readonly photo: WallPhoto; readonly step: WallStep }) {
  const { document, unit, edit } = useDesk();
  const reading = useMemo(() => readWallPhoto(photo), [photo]);
  return (
    <>
      <div className="grid grid-cols-2 gap-3">
        <Select
          label="Taped sheet"
          value={photo.paper}
          onChange={(event) => {
            const paper = event.target.value === "Letter" ? "Letter" : "A4";
            edit({ label: "Choose the sheet", change: (before) => setSheet(before, { paper }) });
          }}
        >
          <option value="A4">A4</option>
          <option value="Letter">Letter</option>
        </Select>
        <Select
          label="It is taped"
          value={photo.lies}
          onChange={(event) => {
            const lies = event.target.value === "lying" ? "lying" : "upright";
            edit({ label: "Turn the sheet", change: (before) => setSheet(before, { lies }) });
          }}
        >
          <option value="upright">upright</option>
          <option value="lying">lying</option>
        </Select>
      </div>
      {step === "mark" ? (
        <fieldset>
          <legend className="font-sans text-sm font-semibold text-ink">Corners in the photo, px across and down</legend>
          <div className="mt-1 space-y-1">
            {photo.corners.map((at, corner) => {
              const name = cornerNames[corner] ?? "";
              const put = (to: Partial<typeof at>) =>
                edit({
                  label: "Mark the sheet",
                  change: (before) => markCorner(before, { corner, to: { ...at, ...to } }),
                  together: `wall mark ${corner}`,
                });
              return (
                <div key={name} className="grid grid-cols-[6.5rem_1fr_1fr] items-center gap-2">
                  <span className="text-sm text-graphite">{name}</span>
                  <NumberField
                    label={`${name}, across`}
                    labelHidden
                    value={at.x}
                    onChange={(x) => x !== null && put({ x })}
                  />
                  <NumberField
                    label={`${name}, down`}
                    labelHidden
                    value={at.y}
                    onChange={(y) => y !== null && put({ y })}
                  />
                </div>
              );
            })}
          </div>
        </fieldset>
      ) : (
        <div className="grid grid-cols-2 gap-3">
          <LengthField
            label="Right of the sheet"
            hint="middle to middle"
            unit={unit}
            value={photo.at.x}
            onChange={(x) =>
              x !== null &&
              edit({ label: "Hang the sign", change: (before) => hangAt(before, { x }), together: "wall place" })
            }
          />
          <LengthField
            label="Below the sheet"
            hint="middle to middle"
            unit={unit}
            value={photo.at.y}
            onChange={(y) =>
              y !== null &&
              edit({ label: "Hang the sign", change: (before) => hangAt(before, { y }), together: "wall place" })
            }
          />
        </div>
      )}
      {isUnmarked(photo) && (
        <p className="border-t border-rule pt-3 text-sm text-ink">
          Put the four marks on the corners of the taped sheet first: what is read from them is said here then.
        </p>
      )}
      {reading.ok && !isUnmarked(photo) && (
        <div className="space-y-2 border-t border-rule pt-3 text-sm text-ink">
          <p>{placeOnWallWords(document, photo, unit)}</p>
          <p>{errorWords(document, photo, reading.value, unit)}</p>
          <p className={cx(isDoubtful(reading.value.residualPx) && "border-l-4 border-ochre pl-3")}>
            {residualWords(reading.value, unit)}
          </p>
          <p className="text-graphite">{depthWords(reading.value)}</p>
          <p className="text-graphite">
            The sheet is taken to be taped level and flat. A larger sheet, or one nearer to the sign, makes the picture
            truer.
          </p>
        </div>
      )}
    </>
  );
}
