import { MarginHead, MarginNote } from "@/components/shell/margin";

export function AboutTheLog() {
  return (
    <>
      <MarginHead>What a seal proves</MarginHead>
      <MarginNote>
        Each entry holds the digest of the one before it. Change one character anywhere and every later seal fails.
      </MarginNote>
      <MarginNote>
        It proves order and integrity. It doesn’t prove that the figures are right, or that the person was entitled to sign.
      </MarginNote>
      <MarginNote>Seals are recomputed here, in your browser, from the stored text. Choose an entry to read it.</MarginNote>
    </>
  );
}
