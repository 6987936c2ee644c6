/** A native radio drawn as ours: ring and dot. Where the system forces its colours, the system draws it. */
export const radioLook =
  "mt-px h-[22px] w-[22px] flex-none cursor-pointer appearance-none rounded-full border-2 border-rule-3 bg-field " +
  "checked:border-ink checked:bg-ink checked:shadow-[inset_0_0_0_4px_var(--field)] disabled:cursor-not-allowed " +
  "forced-colors:appearance-auto";
