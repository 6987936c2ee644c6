import type { ReactNode } from "react";
import { SourceMark, sourceWords, type SourceKind } from "./source-mark";

const lookOf = (kind: SourceKind) => (kind === "missing" ? "text-beyond" : "text-ink");

/** Shape, word and text of a source, as it stands at the right of a line. */
export function SourceNote({ kind, children }: { kind: SourceKind; children?: ReactNode }) {
  return (
    <span className="flex items-baseline gap-2 text-left font-serif text-note leading-[1.3] text-ink-2">
      <SourceMark kind={kind} />
      <span>
        <b className={`font-num text-label leading-none ${lookOf(kind)}`}>{sourceWords[kind]}</b> {children}
      </span>
    </span>
  );
}

/**
 * The same note as a button that opens what edits it (Alt+S at the line).
 *
 * label   names the act for readers by ear: "Source of Wall thickness"
 */
export function SourceButton({
  kind,
  children,
  label,
  expanded,
  onOpen,
}: {
  kind: SourceKind;
  children?: ReactNode;
  label: string;
  expanded?: boolean;
  onOpen: () => void;
}) {
  return (
    <button
      type="button"
      aria-label={label}
      aria-expanded={expanded}
      onClick={onOpen}
      className="min-h-[34px] w-full phone:min-h-[44px]"
    >
      <SourceNote kind={kind}>{children ?? (kind === "missing" ? "say where the value comes from" : null)}</SourceNote>
    </button>
  );
}

/** The keys of the marks, for the head of a part. */
export function SourceKeys() {
  return (
    <>
      Source keys:{" "}
      {(["sheet", "measured", "derived", "assumed"] as const).map((kind) => (
        <span key={kind} className="whitespace-nowrap">
          <SourceMark kind={kind} /> {sourceWords[kind].toLowerCase()}
          {"\u2002"}
        </span>
      ))}
    </>
  );
}
