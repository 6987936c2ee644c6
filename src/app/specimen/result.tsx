import { CautionBlock } from "@/components/caution/caution-block";
import { Figure } from "@/components/verdict/figure";
import { LimitTable } from "@/components/verdict/limit-table";
import { VerdictSentence } from "@/components/verdict/verdict-sentence";

/** The head of a result: sentence, limits, cautions. */
export function SpecimenResult() {
  return (
    <section className="mt-9">
      <VerdictSentence
        verdict="near"
        figure={<Figure label="Governing figure, line A7.02" value="−27.2" rest="°C at 21.4 min" />}
      >
        The inner wall comes within 1.8 K of its minimum design metal temperature.
      </VerdictSentence>
      <LimitTable
        caption="Limits"
        rows={[
          {
            no: "A7.01",
            title: "Time to 6.90 bar(g)",
            computed: "13.6 min",
            limit: "at most 15.0 min",
            inHand: "1.4 min",
            note: "9 %",
            share: 0.907,
            verdict: "near",
            governs: false,
          },
          {
            no: "A7.02",
            title: "Lowest inner wall",
            computed: "−27.2 °C",
            limit: "not below −29.0 °C",
            inHand: "1.8 K",
            note: "band 10 K",
            share: 0.97,
            verdict: "near",
            governs: true,
          },
          {
            no: "A7.04",
            title: "Peak vent load",
            computed: "16.7 kg/s",
            limit: "at most 14.0 kg/s",
            inHand: "−2.7 kg/s",
            share: 1.19,
            verdict: "beyond",
            governs: false,
          },
          {
            no: "A7.05",
            title: "Fluid leaving the orifice",
            computed: "−87.7 °C",
            limit: "not below −104.0 °C",
            inHand: "16.3 K",
            share: 0.86,
            verdict: "within",
            governs: false,
          },
          {
            no: "A7.06",
            title: "Stand-off, 0.07 bar side-on",
            computed: "99 m",
            limit: null,
            inHand: null,
            share: null,
            verdict: "open",
            governs: false,
          },
        ]}
      />
      <CautionBlock
        cautions={[
          {
            id: "C1",
            words:
              "This is a screening. It does not size, rate or approve equipment. A licensed engineer reviews it under the code that applies at the site before anyone relies on it.",
          },
          {
            id: "C2",
            words:
              "One gas temperature and one wall temperature stand for the whole vessel. Nozzles, supports, dead legs and the liquid space can be colder than the wall shown here.",
          },
          {
            id: "C3",
            words:
              "Liquid is likely to form below about −9 °C. Liquid that boils on the wall can take it below the figure on line 7.02.",
          },
        ]}
        also="Also standing, beside what they concern: C4 at line 7.05, C6 in the margin."
      />
    </section>
  );
}
