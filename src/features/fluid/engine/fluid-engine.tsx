"use client";

import { createContext, useContext, useEffect, useId, useMemo, useState, type ReactNode } from "react";
import type { FluidAnswer, FluidAnswers, FluidAsk, FluidAskKind } from "@/workers/fluid-asks";
import { EngineClient, type Told } from "./engine-client";

/** A pause short enough that figures follow the typing, long enough that a number is finished. */
const restMs = 60;

type Clients = { quick: EngineClient; slow: EngineClient };

const EngineContext = createContext<Clients | null>(null);

/** The diagram may take seconds with a large equation; it has a worker of its own, so that figures never wait for it. */
const slow: ReadonlySet<FluidAskKind> = new Set(["envelope", "lines"]);

const startWorker = () => new Worker(new URL("../../../workers/browser.ts", import.meta.url), { type: "module" });

/** Holds the workers of a page of fluids for as long as the page stands. */
export function FluidEngine({ children }: { children: ReactNode }) {
  const clients = useMemo<Clients>(() => ({ quick: new EngineClient(startWorker), slow: new EngineClient(startWorker) }), []);
  useEffect(
    () => () => {
      clients.quick.end();
      clients.slow.end();
    },
    [clients],
  );
  return <EngineContext.Provider value={clients}>{children}</EngineContext.Provider>;
}

export type FluidAnswered<K extends FluidAskKind> = {
  /** The newest answer; kept while another is on its way. */
  value: FluidAnswers[K] | null;
  /** The value answers the ask as it stands. */
  current: boolean;
  /** Why there is no answer to the ask as it stands. */
  problem: string | null;
};

type Held<K extends FluidAskKind> = { key: string; value: FluidAnswers[K] | null; problem: string | null };

/**
 * The engine's answer to an ask, followed as it changes: latest wins, nothing is stored, nothing blocks the page.
 *
 * ask   nothing while the lines can't be asked for
 */
export function useFluidAnswer<K extends FluidAskKind>(ask: Extract<FluidAsk, { kind: K }> | undefined): FluidAnswered<K> {
  const clients = useContext(EngineContext);
  if (!clients) throw new Error("a page asks of a fluid outside its engine");
  const lane = useId();
  const [held, setHeld] = useState<Held<K> | null>(null);
  const key = ask ? JSON.stringify(ask) : undefined;

  useEffect(() => {
    if (key === undefined) return;
    const asked = JSON.parse(key) as FluidAsk; // written from the ask above
    let takeBack = () => {};
    const rest = setTimeout(() => {
      const client = slow.has(asked.kind) ? clients.slow : clients.quick;
      takeBack = client.ask(lane, asked, (told) => setHeld((before) => heldOf(key, told, before)));
    }, restMs);
    return () => {
      clearTimeout(rest);
      takeBack();
    };
  }, [clients, key, lane]);

  const isCurrent = held !== null && held.key === key;
  return {
    value: held?.value ?? null,
    current: isCurrent && held.problem === null,
    problem: isCurrent ? held.problem : null,
  };
}

function heldOf<K extends FluidAskKind>(key: string, told: Told, before: Held<K> | null): Held<K> {
  if ("problem" in told) return { key, value: before?.value ?? null, problem: told.problem };
  return { key, value: valueOf<K>(told.answer), problem: null };
}

/** The client tells each ask the answer of its own kind. */
const valueOf = <K extends FluidAskKind>(answer: FluidAnswer) => answer.value as FluidAnswers[K];
