"use client";

import { formatPercent } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { SitePressure } from "@/components/units/units-provider";
import { FactTable } from "@/components/table/table";
import type { FacilityView } from "@/contracts/views";

/** What screenings of a facility are held against, unless a line of part 7 says otherwise. */
export function PolicyTable({ facility }: { facility: FacilityView }) {
  return (
    <SitePressure barometricPressurePa={facility.barometricPressurePa}>
      <Policy facility={facility} />
    </SitePressure>
  );
}

function Policy({ facility: { policy, barometricPressurePa } }: { facility: FacilityView }) {
  const shown = useShown();
  const absolute = { unit: { SI: "bar(a)", US: "psia" } };
  return (
    <FactTable
      settled
      caption={`Limit policy ${policy.name} rev ${policy.rev}`}
      facts={[
        {
          label: "Time to target pressure, 7.01 and 7.09",
          value: `at most ${shown("time", policy.targetTimeS).text} to ${shown("pressure", policy.targetPressurePaGauge + barometricPressurePa).text}`,
        },
        {
          label: "Steel above its rated temperature, 7.02",
          value: shown("temperatureDifference", policy.minimumMetalMarginK).text,
        },
        {
          label: "Fluid leaving the opening, 7.03",
          value:
            policy.minimumOutletTemperatureK === undefined
              ? "no limit"
              : `not below ${shown("temperature", policy.minimumOutletTemperatureK).text}`,
        },
        {
          label: "Peak vent load, 7.04",
          value:
            policy.ventCapacityKgPerS === undefined ? "no limit" : `at most ${shown("massRate", policy.ventCapacityKgPerS).text}`,
        },
        {
          label: "Near",
          value: `within ${shown("temperatureDifference", policy.nearBandK).text} or ${formatPercent(policy.nearBandFraction)} of a limit`,
        },
        { label: "Barometric pressure of the site", value: shown("pressure", barometricPressurePa, absolute).text },
      ]}
    />
  );
}
