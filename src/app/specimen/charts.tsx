import { BridgeChart } from "@/components/charts/bridge-chart";
import { CurveChart } from "@/components/charts/curve-chart";
import { invented } from "./invented";

const time = { name: "time", unit: "min", min: 0, max: 25 };

/** Curves and bridge on invented figures, and a chart on its way. */
export function SpecimenCharts() {
  const { minutes, pressure, vent, fluid, wall, wallBefore } = invented;
  return (
    <section className="mt-6 grid grid-cols-2 gap-9 rail:grid-cols-1">
      <div>
        <CurveChart
          caption={
            <>
              <b>Pressure and vent rate.</b> Same time axis.
            </>
          }
          summary="Pressure falls to its target in 13.8 minutes, 1.2 minutes before the time allowed."
          height="panel"
          withoutData
          x={time}
          y={{ name: "pressure", unit: "bar(g)", fromZero: true }}
          series={[{ id: "pressure", label: "pressure", tone: "pressure", x: minutes, y: pressure }]}
          limits={[{ axis: "x", at: 15, label: "15.0 min allowed" }]}
          marks={[{ x: 13.75, y: 6.9, label: "6.90 bar(g) after 13.8 min" }]}
        />
        <CurveChart
          summary="The vent rate peaks at 12.7 kilograms a second at opening."
          height="low"
          x={time}
          y={{ name: "vent rate", unit: "kg/s", fromZero: true }}
          series={[{ id: "vent", label: "vent rate", tone: "vent", x: minutes, y: vent }]}
          limits={[{ axis: "y", at: 14, label: "14.0 kg/s allotted" }]}
          marks={[{ x: 0, y: 12.7, label: "peak 12.7" }]}
        />
      </div>
      <CurveChart
        caption={
          <>
            <b>Temperature.</b> Dotted: inner wall before the last edit.
          </>
        }
        summary="The inner wall stays 1.8 kelvin above its limit."
        x={time}
        y={{ name: "temperature", unit: "°C" }}
        series={[
          { id: "before", label: "", tone: "ghost", x: minutes, y: wallBefore },
          { id: "fluid", label: "fluid", tone: "fluid", x: minutes, y: fluid },
          { id: "wall", label: "inner wall", tone: "wall", x: minutes, y: wall },
        ]}
        limits={[{ axis: "y", at: -29, label: "minimum design metal temperature −29.0 °C" }]}
        marks={[
          { x: 9, y: -57.5, label: "lowest fluid −57.5" },
          { x: 21.5, y: wall[86] ?? 0, label: "−26.6 at 21.5 min" },
        ]}
      />
      <BridgeChart
        caption={
          <>
            <b>Energy ledger, three steps.</b> Start to coldest fluid, kJ/kg.
          </>
        }
        unit="kJ/kg"
        steps={[
          { label: "Departure out", note: "real gas at the start to ideal gas", value: 128.8 },
          { label: "Ideal-gas change", note: "8.5 °C to −56.9 °C", value: -116.6 },
          { label: "Departure back", note: "ideal gas to real gas", value: -35.9 },
        ]}
        sum={{ label: "Change of enthalpy", note: "sum of the three steps" }}
      />
      <CurveChart
        caption="A chart on its way"
        summary=""
        loading
        height="panel"
        x={time}
        y={{ name: "pressure", unit: "bar(g)", fromZero: true }}
        series={[]}
      />
    </section>
  );
}
