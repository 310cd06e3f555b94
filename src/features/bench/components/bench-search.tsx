import { useEffect, useRef, useState } from "react";

/** Finds jobs while one types, after a short rest. */
export function BenchSearch({ value, onChange }: { readonly value: string; readonly onChange: (q: string) => void }) {
  const [text, setText] = useState(value);
  const told = useRef(value);
  useEffect(() => {
    if (value === told.current) return;
    told.current = value;
    setText(value);
  }, [value]);
  useEffect(() => {
    if (text.trim() === told.current) return;
    const timer = window.setTimeout(() => {
      told.current = text.trim();
      onChange(text.trim());
    }, 300);
    return () => window.clearTimeout(timer);
  }, [text, onChange]);
  return (
    <search className="min-w-0 flex-1 lg:w-56 lg:flex-none">
      <input
        type="search"
        aria-label="Find a job, client or word"
        placeholder="Find a job, client or word"
        value={text}
        onChange={(event) => setText(event.target.value)}
        className="min-h-11 w-full border-b border-ink bg-transparent px-1 text-base text-ink placeholder:text-graphite lg:text-sm"
      />
    </search>
  );
}
