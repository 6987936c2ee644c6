import { palette, type ColourName } from "@/components/theme/palette";

const names = Object.keys(palette.light) as ColourName[];

/** Every colour of one theme. Fills are SVG attributes: a style attribute would break the content policy. */
export function SpecimenSwatches() {
  return (["light", "dark"] as const).map((theme) => (
    <section key={theme} className="mt-7">
      <h2 className="mb-2.5">Colour, {theme}</h2>
      <div data-theme={theme} className="grid grid-cols-[repeat(auto-fill,minmax(148px,1fr))] gap-2.5 bg-sheet p-3 text-ink">
        {names.map((name) => (
          <div key={name} className="border border-rule-2 text-label">
            <svg width="100%" height="44" aria-hidden="true" className="block">
              <rect width="100%" height="44" fill={palette[theme][name]} />
            </svg>
            <p className="px-2 py-[5px]">
              <b>{name}</b> {palette[theme][name]}
            </p>
          </div>
        ))}
      </div>
    </section>
  ));
}
