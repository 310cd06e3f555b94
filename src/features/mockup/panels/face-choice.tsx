import "./lettering-faces.css";
import { useLayoutEffect, useRef } from "react";
import { faces, nameOfFace } from "#shared/lettering/faces.ts";
import { cx } from "@/lib/cx.ts";

type FaceChoiceProps = {
  readonly value: string;
  readonly onChange: (key: string) => void;
  /** What each face is shown with: the words that are to be set. */
  readonly sample: string;
};

/** The shipped faces to choose one of, each in its own letters. */
export function FaceChoice({ value, onChange, sample }: FaceChoiceProps) {
  const list = useRef<HTMLDivElement>(null);
  const first = useRef(value);
  useLayoutEffect(() => {
    const chosen = list.current?.querySelector<HTMLElement>(`label:has(input[value="${first.current}"])`);
    if (list.current && chosen) list.current.scrollTop = chosen.offsetTop - chosen.offsetHeight / 2;
  }, []);
  return (
    <fieldset>
      <legend className="text-sm font-semibold text-ink">Face</legend>
      {/* Room for the ring round a face that has the focus, which would be clipped else. */}
      <div
        ref={list}
        className="relative mt-1 grid max-h-50 gap-1 overflow-y-auto border border-rule p-1.5 sm:grid-cols-2 lg:grid-cols-3"
      >
        {faces.map((face) => {
          const name = nameOfFace(face);
          return (
            <label
              key={face.key}
              className={cx(
                "relative block min-w-0 cursor-pointer rounded border px-2.5 py-1.5 hover:bg-linen has-focus-visible:outline-2 has-focus-visible:outline-indigo",
                value === face.key ? "border-indigo bg-indigo/8" : "border-rule",
              )}
            >
              <input
                type="radio"
                name="face"
                value={face.key}
                checked={value === face.key}
                onChange={() => onChange(face.key)}
                aria-label={name}
                aria-describedby={`face-${face.key}`}
                className="absolute top-2 right-2 size-4 accent-indigo"
              />
              <span
                aria-hidden="true"
                className={cx("block truncate pr-5 text-xl leading-normal text-ink", `face-${face.key}`)}
              >
                {sample === "" ? face.family : sample}
              </span>
              <span id={`face-${face.key}`} className="block text-fine text-graphite">
                <span className="text-ink">{name}.</span> {face.suits}
              </span>
            </label>
          );
        })}
      </div>
      <p className="mt-1 text-fine text-graphite">
        All are open fonts that may be cut and sold on a sign.{" "}
        <a
          href="/font-licences.txt"
          target="_blank"
          rel="noreferrer"
          className="text-indigo underline underline-offset-4 hover:text-ink"
        >
          Their licences
        </a>
      </p>
    </fieldset>
  );
}
