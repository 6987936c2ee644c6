import type { NonAnalyticTerm } from "./reference-data";
import type { ReducedDerivatives } from "./reduced-terms";

/** Exponent past which ψ is below 1e-22: the term cannot reach a digit of anything. */
const farAway = 50;

/**
 * Adds one non-analytic term n Δ^b δ ψ, which bends the equation near the critical point.
 *
 *   Δ = θ² + B [(δ − 1)²]^a,  θ = (1 − τ) + A [(δ − 1)²]^(1/(2β)),  ψ = exp[−C (δ − 1)² − D (τ − 1)²]
 *
 * Source   IAPWS R6-95(2018), Table 5, derivatives of the residual part; Span and Wagner, J. Phys. Chem. Ref. Data 25 (1996)
 *          1509, Table 32.
 */
export function addNonAnalytic(term: NonAnalyticTerm, delta: number, tau: number, out: ReducedDerivatives): void {
  const { n, a, b, beta, A, B, C, D } = term;
  // At δ = 1 the derivatives have a finite limit that the formulae reach as 0/0: step aside by less than any table shows.
  const x = Math.abs(delta - 1) < 1e-10 ? 1e-10 : delta - 1;
  const y = tau - 1;
  const xx = x * x;
  const remoteness = C * xx + D * y * y;
  if (remoteness > farAway) return;
  const power = xx ** (1 / (2 * beta) - 1);
  const theta = -y + A * power * xx;
  const bowl = B * xx ** (a - 1);
  const Delta = theta * theta + bowl * xx;
  const Delta_d = x * (A * theta * (2 / beta) * power + 2 * a * bowl);
  const Delta_dd =
    Delta_d / x +
    4 * a * (a - 1) * bowl +
    2 * A * A * (1 / beta) ** 2 * power * power * xx +
    A * theta * (4 / beta) * (1 / (2 * beta) - 1) * power;
  const P = Delta ** b;
  const P1 = (b * P) / Delta;
  const P2 = ((b - 1) * P1) / Delta;
  const P_d = P1 * Delta_d;
  const P_dd = P1 * Delta_dd + P2 * Delta_d * Delta_d;
  const P_t = -2 * theta * P1;
  const P_tt = 2 * P1 + 4 * theta * theta * P2;
  const P_dt = -A * (2 / beta) * P1 * x * power - 2 * theta * P2 * Delta_d;
  const psi = Math.exp(-remoteness);
  const psi_d = -2 * C * x * psi;
  const psi_dd = (2 * C * xx - 1) * 2 * C * psi;
  const psi_t = -2 * D * y * psi;
  const psi_tt = (2 * D * y * y - 1) * 2 * D * psi;
  const psi_dt = 4 * C * D * x * y * psi;

  out.a += n * P * delta * psi;
  out.d += delta * n * (P * (psi + delta * psi_d) + P_d * delta * psi);
  out.dd += delta * delta * n * (P * (2 * psi_d + delta * psi_dd) + 2 * P_d * (psi + delta * psi_d) + P_dd * delta * psi);
  out.t += tau * n * delta * (P_t * psi + P * psi_t);
  out.tt += tau * tau * n * delta * (P_tt * psi + 2 * P_t * psi_t + P * psi_tt);
  out.dt +=
    delta * tau * n * (P * (psi_t + delta * psi_dt) + delta * P_d * psi_t + P_t * (psi + delta * psi_d) + P_dt * delta * psi);
}
