import "server-only";
import { createHmac } from "node:crypto";
import { env } from "@/server/env";
import { Refusal } from "@/server/refusal";
import { PoolError, ThreadPool } from "@/server/threads/thread-pool";

type Holder = { ebbmarkPasswordPool?: ThreadPool };

/** Two hashes at once and twenty waiting: a flood of sign-ins slows itself, not the calculations. */
const pool = (): ThreadPool =>
  ((globalThis as Holder).ebbmarkPasswordPool ??= new ThreadPool({
    file: env().passwordThread,
    size: 2,
    longestQueue: 20,
    budgetMs: 20_000,
    resourceLimits: { maxOldGenerationSizeMb: 64 },
  }));

/**
 * What is really hashed: base64(HMAC-SHA-384(pepper, NFKC(password))), 64 characters, because bcrypt reads only 72 bytes and stops at a
 * zero byte.
 *
 * Source   OWASP Password Storage Cheat Sheet, pre-hashing passwords with bcrypt (from memory).
 */
export const bcryptInput = (password: string, pepper: string): string =>
  createHmac("sha384", pepper).update(password.normalize("NFKC"), "utf8").digest("base64");

export const hashPassword = (password: string): Promise<string> =>
  send<string>({ act: "hash", input: bcryptInput(password, env().passwordPepper), cost: env().bcryptCost });

/** Compares with the stored hash; without one, with a dummy of the same cost, so that an unknown badge takes as long as a known one. */
export async function passwordHolds(password: string, hash: string | undefined): Promise<boolean> {
  const holds = await send<boolean>({
    act: "compare",
    input: bcryptInput(password, env().passwordPepper),
    hash: hash ?? dummyHash(env().bcryptCost),
  });
  return hash !== undefined && holds;
}

/** A well-formed bcrypt text that no input is known to reach. */
const dummyHash = (cost: number): string => `$2b$${String(cost).padStart(2, "0")}$${"ebbmarkebbmarkebbmarke"}${"a".repeat(31)}`;

/** Words that would make a password guessable here; a password is refused when it is made of little else. */
const contextWords = ["ebbmark", "password", "blowdown", "letmein", "welcome", "qwerty", "123456789"];

/** Throws   Refusal "invalid-request" that says why the password can't be taken. Length is counted in characters, after NFKC. */
export function checkNewPassword(password: string, who: { badge: string; printedName: string }, path: string): void {
  const text = password.normalize("NFKC");
  const length = [...text].length;
  const refuse = (message: string): never => {
    throw new Refusal("invalid-request", { problems: [{ path, message }] });
  };
  if (length < 15) refuse(`This has ${length} characters. Use 15 or more; a few unrelated words do well.`);
  if (length > 128) refuse(`This has ${length} characters. Use 128 or fewer.`);
  if (new Set(text).size < 5) refuse("This repeats a few characters. Use a few unrelated words.");
  const bare = text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, "");
  const own = [who.badge, who.printedName].map((word) => word.toLowerCase().replace(/[^\p{L}\p{N}]/gu, ""));
  const rest = [...contextWords, ...own].reduce((left, word) => left.replaceAll(word, ""), bare).replace(/\d+$/, "");
  if (rest.length < 4)
    refuse("This is made of your badge, your name or a word that is guessed first. Use a few unrelated words.");
}

async function send<T>(job: unknown): Promise<T> {
  try {
    return await pool().run<T>(job);
  } catch (error) {
    if (error instanceof PoolError && error.trouble === "queue-full") {
      throw new Refusal("busy", {
        detail: "Too many people sign in at this moment. Try again in a few seconds.",
        retryAfterS: 5,
      });
    }
    throw error;
  }
}
