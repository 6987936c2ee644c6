import { describe, expect, it } from "vitest";
import { parseEnv } from "./env";

const whole = {
  NODE_ENV: "test",
  EBBMARK_ORIGIN: "http://localhost:3000",
  DATABASE_URL_READ: "postgresql://r:p@127.0.0.1:5432/ebbmark",
  DATABASE_URL_WRITE: "postgresql://w:p@127.0.0.1:5432/ebbmark",
  DATABASE_URL_SIGN: "postgresql://s:p@127.0.0.1:5432/ebbmark",
  SESSION_SECRET: "s".repeat(32),
  PASSWORD_PEPPER: "p".repeat(32),
  EBBMARK_ENGINE_DIR: "/somewhere/engines",
  EBBMARK_ENGINE_THREAD: "/somewhere/engines/server-thread.mjs",
  EBBMARK_PASSWORD_THREAD: "/somewhere/engines/password-thread.mjs",
};

const refusal = (source: Record<string, string | undefined>): string => {
  try {
    parseEnv(source);
  } catch (error) {
    return (error as Error).message;
  }
  throw new Error("nothing was refused");
};

describe("parseEnv", () => {
  it("reads a whole environment and fills the defaults", () => {
    const env = parseEnv(whole);
    expect(env).toMatchObject({
      origin: "http://localhost:3000",
      secure: false,
      bcryptCost: 12,
      demo: false,
      production: false,
      logLevel: "info",
    });
    expect(parseEnv({ ...whole, EBBMARK_ORIGIN: "https://ebb.example", BCRYPT_COST: "4", EBBMARK_DEMO: "1" })).toMatchObject({
      secure: true,
      bcryptCost: 4,
      demo: true,
    });
  });

  it("names every missing variable at once", () => {
    const message = refusal({ ...whole, SESSION_SECRET: undefined, DATABASE_URL_SIGN: undefined, EBBMARK_ENGINE_DIR: "" });
    for (const name of ["SESSION_SECRET", "DATABASE_URL_SIGN", "EBBMARK_ENGINE_DIR"])
      expect(message).toContain(`${name} is not set`);
    expect(message).not.toContain("PASSWORD_PEPPER");
  });

  it.each([
    ["EBBMARK_ORIGIN", "http://localhost:3000/", /EBBMARK_ORIGIN is not such an address; write it like http/],
    ["DATABASE_URL_READ", "mysql://x", /DATABASE_URL_READ is not such an address/],
    ["SESSION_SECRET", "short", /SESSION_SECRET is shorter than 32/],
    ["BCRYPT_COST", "many", /BCRYPT_COST is not a number/],
    ["BCRYPT_COST", "3", /BCRYPT_COST is below 4/],
    ["EBBMARK_DEMO", "yes", /EBBMARK_DEMO is neither/],
  ])("says what is wrong with %s", (name, value, sentence) => {
    const message = refusal({ ...whole, [name]: value });
    expect(message).toMatch(sentence);
  });

  it("keeps values out of the message", () => {
    expect(refusal({ ...whole, SESSION_SECRET: "tell-nobody", DATABASE_URL_READ: "http://u:hidden@x" })).not.toMatch(
      /tell-nobody|hidden/,
    );
  });
});
