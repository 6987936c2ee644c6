import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { PreviewAnswer, WorkerRequest } from "@/workers/browser";
import type { FluidAnswer, FluidAsk } from "@/workers/fluid-asks";
import { EngineClient, type EngineWorker, type Told } from "./engine-client";

class FakeWorker implements EngineWorker {
  onmessage: EngineWorker["onmessage"] = null;
  onerror: EngineWorker["onerror"] = null;
  asked: WorkerRequest[] = [];
  ended = false;
  postMessage(request: WorkerRequest) {
    this.asked.push(request);
  }
  terminate() {
    this.ended = true;
  }
  say(answer: PreviewAnswer) {
    this.onmessage?.({ data: answer } as MessageEvent<PreviewAnswer>);
  }
}

const fluid = { components: [{ id: "methane", moleFraction: 1 }], equation: "peng-robinson-1976" as const };
const envelope: FluidAsk = { kind: "envelope", fluid };
const equations = (temperatureK: number): FluidAsk => ({ kind: "equations", fluid, point: { temperatureK, pressurePa: 1e5 } });
const answer: FluidAnswer = { kind: "equations", value: [] };

let workers: FakeWorker[];
const client = () =>
  new EngineClient(() => {
    const worker = new FakeWorker();
    workers.push(worker);
    return worker;
  });

beforeEach(() => {
  workers = [];
  vi.useFakeTimers();
});
afterEach(() => void vi.useRealTimers());

describe("the engine's client", () => {
  it("tells the answer to the newest ask of a lane, and only that", () => {
    const told: Record<string, Told[]> = { old: [], new: [] };
    const engine = client();
    engine.ask("table", equations(300), (one) => told.old?.push(one));
    engine.ask("table", equations(310), (one) => told.new?.push(one));
    workers[0]?.say({ type: "fluid", id: 1, answer });
    workers[0]?.say({ type: "fluid", id: 2, answer });
    expect(told).toEqual({ old: [], new: [{ answer }] });
  });

  it("lets lanes stand side by side", () => {
    const told: string[] = [];
    const engine = client();
    engine.ask("diagram", envelope, () => told.push("envelope"));
    engine.ask("table", equations(300), () => told.push("equations"));
    workers[0]?.say({ type: "fluid", id: 2, answer });
    workers[0]?.say({ type: "failed", id: 1, message: "a fault" });
    expect(told).toEqual(["equations", "envelope"]);
  });

  it("ends a worker that is in the way, and asks it again for what still waits", () => {
    const engine = client();
    engine.ask("diagram", envelope, () => undefined);
    vi.advanceTimersByTime(1500);
    engine.ask("table", equations(300), () => undefined);
    expect(workers.map(({ ended }) => ended)).toEqual([true, false]);
    expect(workers[1]?.asked.map((request) => "ask" in request && request.ask.kind)).toEqual(["equations", "envelope"]);
  });

  it("makes a sentence of a refusal, and says so when it takes too long", () => {
    const told: Told[] = [];
    const engine = client();
    engine.ask("table", equations(1), (one) => told.push(one));
    const problems = [{ path: "from", message: "temperature must be above 10 K" }];
    workers[0]?.say({ type: "refused", id: 1, error: { format: "ebbmark-error/1", code: "outside-validity", problems } });
    engine.ask("diagram", envelope, (one) => told.push(one));
    vi.advanceTimersByTime(31_000);
    expect(told).toEqual([
      { problem: "Temperature must be above 10 K." },
      { problem: expect.stringContaining("takes too long") as string },
    ]);
    expect(workers[0]?.ended).toBe(true);
  });

  it("starts once more when its code did not arrive, and then says so", () => {
    const told: Told[] = [];
    client().ask("table", equations(300), (one) => told.push(one));
    const fail = (worker: FakeWorker | undefined) => worker?.onerror?.({} as ErrorEvent);
    fail(workers[0]);
    expect(workers.map(({ ended, asked }) => [ended, asked.length])).toEqual([
      [true, 1],
      [false, 1],
    ]);
    expect(told).toEqual([]);
    fail(workers[1]);
    expect(told).toEqual([{ problem: expect.stringContaining("could not be started") as string }]);
  });

  it("tells nothing once an ask is taken back", () => {
    const told: Told[] = [];
    const back = client().ask("table", equations(300), (one) => told.push(one));
    back();
    workers[0]?.say({ type: "fluid", id: 1, answer });
    vi.advanceTimersByTime(60_000);
    expect(told).toEqual([]);
  });
});
