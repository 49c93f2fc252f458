"use client";

import { useRef, useState } from "react";

import { useHydrated } from "../use-hydrated";
import { picturePng } from "./picture-png";
import { pictureSvg } from "./picture-svg";

type Format = "svg" | "png";

/** Saves the picture of the figure in which it stands. */
export function SaveFigure() {
  const isHydrated = useHydrated();
  const place = useRef<HTMLSpanElement>(null);
  const [fault, setFault] = useState("");

  async function save(format: Format) {
    const figure = place.current?.closest("figure");
    const picture = figure?.querySelector('[role="img"]');
    if (!figure || !(picture instanceof HTMLElement)) return;
    setFault("");
    try {
      const drawing = pictureSvg(picture, picture.getAttribute("aria-label") ?? document.title);
      const file = format === "png" ? await picturePng(drawing) : new Blob([drawing.text], { type: "image/svg+xml" });
      download(file, `${fileName(figure)}.${format}`);
    } catch (problem) {
      setFault(`The picture could not be saved: ${problem instanceof Error ? problem.message : "unknown reason"}`);
    }
  }

  return (
    <span ref={place} className="flex flex-wrap gap-x-4 print:hidden">
      {(["svg", "png"] as const).map((format) => (
        <button
          key={format}
          type="button"
          disabled={!isHydrated}
          onClick={() => void save(format)}
          className="link min-h-6 text-sm"
        >
          Save as {format.toUpperCase()}
        </button>
      ))}
      <span role="status" className="text-signal">
        {fault}
      </span>
    </span>
  );
}

/** "budget-of-tf2-leeboard-1": the sheet, and which of its figures. */
function fileName(figure: Element): string {
  const sheet = document.title.toLowerCase().replaceAll(/[^a-z0-9]+/g, "-");
  return `${sheet}-${[...document.querySelectorAll("figure")].findIndex((each) => each === figure) + 1}`;
}

function download(file: Blob, name: string): void {
  const address = URL.createObjectURL(file);
  const link = document.createElement("a");
  link.href = address;
  link.download = name;
  link.click();
  // The download has begun by then; an address that is never given back keeps the file in memory.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
