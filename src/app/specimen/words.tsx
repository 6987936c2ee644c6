import { Button } from "@/components/button/button";
import { SourceNote } from "@/components/line/source-note";
import { Power } from "@/components/quantity/quantity";
import { SealWord } from "@/components/log/seal-word";
import { Figure } from "@/components/verdict/figure";
import { StateWord } from "@/components/verdict/state-word";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { SpecimenSection } from "./section";

/** Type, figures, words with their signs, sources, buttons. */
export function SpecimenWords() {
  return (
    <div className="grid grid-cols-3 gap-x-10 gap-y-[30px] rail:grid-cols-1">
      <SpecimenSection title="Type">
        <p className="font-serif text-title font-medium">Sheet title 30/34</p>
        <p className="font-serif text-head font-medium">Section head 22/27</p>
        <p className="font-serif text-prose">
          Margin note 17/24, <i>never signed without reading</i>
        </p>
        <p>Line label 16/22 Wall thickness, nominal</p>
        <p className="text-label text-ink-3">Small 13/18 coincident pressure</p>
        <Figure label="Governing figure, line 7.02" value="−27.2" rest="°C at 21.4 min" />
      </SpecimenSection>
      <SpecimenSection title="Figures and signs">
        <table className="ruled">
          <tbody>
            <tr>
              <td className="numeric">12 345.67</td>
              <td>bar(a)</td>
              <td className="numeric">11 111.11</td>
            </tr>
            <tr>
              <td className="numeric">−46.1</td>
              <td>°C</td>
              <td className="numeric">0.0045</td>
            </tr>
            <tr>
              <td className="numeric">412.6</td>
              <td>kJ/kg</td>
              <td className="numeric">
                <Power value={3.2e-6} />
              </td>
            </tr>
            <tr>
              <td className="numeric">150</td>
              <td>W/(m²·K)</td>
              <td className="numeric">±0.5</td>
            </tr>
          </tbody>
        </table>
        <p className="pt-2">
          C<sub>7</sub>H<sub>16</sub>, CO<sub>2</sub>, H<sub>2</sub>S · Δh, γ, ρ, μ, ω, η · ≤ ≥ ≈ → √ ∂ ∑
        </p>
        <p className="font-serif text-prose">
          p = ρRT/M · (∂u/∂v)<sub>T</sub> · Δh, γ, ρ, μ, ω
        </p>
      </SpecimenSection>
      <SpecimenSection title="Words with their signs">
        <div className="grid gap-[7px] pb-3">
          <span>
            <VerdictWord verdict="within" /> under the mark
          </span>
          <span>
            <VerdictWord verdict="near" /> in the near band
          </span>
          <span>
            <VerdictWord verdict="beyond" /> over the mark
          </span>
          <span>
            <VerdictWord verdict="open" /> no limit, or not computed
          </span>
        </div>
        <div className="grid gap-1">
          {(["draft", "computed", "signed", "countersigned", "returned", "superseded", "withdrawn"] as const).map((state) => (
            <StateWord key={state} state={state} />
          ))}
          {(["holds", "witnessed", "broken", "not-checked"] as const).map((seal) => (
            <SealWord key={seal} seal={seal} />
          ))}
        </div>
      </SpecimenSection>
      <SpecimenSection title="Source marks">
        <div className="grid gap-1.5">
          <SourceNote kind="sheet">a data sheet, drawing or certificate</SourceNote>
          <SourceNote kind="measured">a tag and a date</SourceNote>
          <SourceNote kind="derived">from other lines</SourceNote>
          <SourceNote kind="assumed">nothing written; a reason is due</SourceNote>
          <SourceNote kind="missing">say where the value comes from</SourceNote>
        </div>
      </SpecimenSection>
      <SpecimenSection title="Buttons">
        <div className="flex flex-wrap items-center gap-3">
          <Button kind="main">Compute in full</Button>
          <Button>Back</Button>
          <Button kind="danger">Return</Button>
          <Button kind="quiet">PDF record</Button>
          <Button waitsFor="Two acknowledgements are missing: C3 and line 7.06.">Sign</Button>
        </div>
        <p className="flex gap-3 pt-3.5">
          <kbd>Enter</kbd> <kbd>/</kbd> <kbd>Alt</kbd> <kbd>S</kbd>
        </p>
      </SpecimenSection>
    </div>
  );
}
