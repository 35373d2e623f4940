"""Expansion histories (the conventions, sections 5 and 6): H, s, rho, t(T), a/a0, f0; fluid and decaying-matter expansions."""
import math
import numpy as np
from scipy.integrate import solve_ivp
from scipy.optimize import brentq
import constants as C
from bath import Bath

class Piecewise:
    """Adaptive piecewise barycentric-Chebyshev interpolant of a vector function of L, cut at given points."""
    N = 24
    def __init__(s, f, lo, hi, cuts=(), tol=1e-13):
        k = np.arange(s.N + 1)
        s.z = np.cos(np.pi * k / s.N); s.w = (-1.0) ** k; s.w[[0, -1]] *= 0.5
        s.f, s.tol = f, tol
        s.lo, s.edge, s.val = [], [], []
        e = sorted({lo, hi, *[c for c in cuts if lo < c < hi]})
        for a, b in zip(e, e[1:]): s._add(a, b, 0, b - a)
        s.edge = np.array(s.lo)
    def _add(s, a, b, depth, _):
        m, h = (a + b) / 2, (b - a) / 2
        eps = 1e-13 * max(1, abs(a), abs(b))                       # stay inside the piece, on its side of a jump
        x = np.clip(m + h * s.z, a + eps, b - eps)
        v = np.array([s.f(t) for t in x])
        c = np.abs(np.real(np.fft.rfft(np.vstack([v, v[-2:0:-1]]), axis=0)) / s.N)
        scale = np.maximum(np.abs(v).max(0), 1.0)
        if depth < 7 and np.any(c[-4:].max(0) > s.tol * scale * 3):
            s._add(a, m, depth + 1, 0); s._add(m, b, depth + 1, 0); return
        s.lo.append(a); s.val.append((a, b, m, h, v))
    def __call__(s, L):
        i = int(np.searchsorted(s.edge, L, side="right")) - 1
        a, b, m, h, v = s.val[max(i, 0)]
        d = (L - m) / h - s.z
        j = np.flatnonzero(np.abs(d) < 1e-15)
        if j.size: return v[j[0]]
        q = s.w / d
        return (q @ v) / q.sum()

T_LATE = 1e-6                                                    # GeV: below it times include matter and Lambda

class History:
    """Radiation or fluid expansion.  Temperatures are the bath's."""
    def __init__(s, spec, t_lo=1e-14, t_hi=1e16, spline_end="natural", cache=True):
        s.spec = spec
        s.bath = Bath(spec, spline_end)
        s.exp = spec.get("expansion", {"kind": "radiation"})
        s.tmax = spec.get("maximumTemperatureGeV")
        s.T0 = spec.get("today", {}).get("temperatureK", C.T0_K) * C.K_B
        s.gs0 = s.bath.g_s_today()
        s.s0 = 2 * math.pi**2 / 45 * s.gs0 * s.T0**3
        today = {"hubbleParameter": 0.674, "omegaMatterH2": 0.143, **spec.get("today", {})}
        s.h2, s.om = today["hubbleParameter"] ** 2, today["omegaMatterH2"]
        s.breaks = s.bath.breaks() + [e["coupling"]["temperatureGeV"] for e in s.bath.extra
                                      if e["coupling"]["kind"] == "decoupled"]
        if s.exp["kind"] == "entropy-step": s.breaks.append(s.exp["temperatureGeV"])
        s.breaks = sorted(s.breaks)
        s.fluid = None
        if s.exp["kind"] == "fluid":
            tr = s.exp["equalityTemperatureGeV"]
            g, gs, _, gx = s.direct(tr)
            s.fluid = (s.exp["index"], tr, gs, g + gx)
        if cache:
            s._c = Piecewise(lambda L: np.array(s._logs(math.exp(L))), math.log(t_lo), math.log(t_hi),
                             [math.log(b) for b in s.breaks])
        else: s._c = lambda L: s._logs(math.exp(L))
    def direct(s, T):
        """g_rho of the bath, g_s, dln g_s/dln T, g_rho of decoupled species."""
        g, gs, d = s.bath(T)
        gx = s.bath.apart(T, gs)[0] if s.bath.extra else 0.0
        return g, gs, d, gx
    def _logs(s, T):
        g, gs, d, gx = s.direct(T)
        return math.log(g + gx), math.log(gs), d
    def g(s, T):
        """(g_rho of all radiation, g_s, delta_s)."""
        a, b, d = s._c(math.log(T))
        return math.exp(a), math.exp(b), d / 3
    def rho_rad(s, T): return math.pi**2 / 30 * s.g(T)[0] * T**4
    def entropy(s, T): return 2 * math.pi**2 / 45 * s.g(T)[1] * T**3
    def rho(s, T, g=None):
        g = g or s.g(T)
        r = math.pi**2 / 30 * g[0] * T**4
        if s.fluid:
            n, tr, gsr, gr = s.fluid
            r += math.pi**2 / 30 * gr * tr**4 * (g[1] / gsr) ** ((4 + n) / 3) * (T / tr) ** (4 + n)
        return r
    def H(s, T, g=None): return math.sqrt(8 * math.pi * s.rho(T, g) / 3) / C.M_PL
    def late(s, T):
        """Matter and Lambda below 1e-6 GeV (flat: omega_Lambda = h^2 - omega_m - omega_r, omega_r the bath's at T_0)."""
        if T >= T_LATE: return 0.0, 0.0
        return s.om * C.RHO_C * s.entropy(T) / s.s0, (s.h2 - s.om) * C.RHO_C - s.rho_rad(s.T0)
    def H_all(s, T, g=None): return math.sqrt(8 * math.pi * (s.rho(T, g) + sum(s.late(T))) / 3) / C.M_PL
    def a_over_a0(s, T):
        D = s.exp["factor"] if s.exp["kind"] == "entropy-step" and T > s.exp["temperatureGeV"] else 1
        return (s.s0 / (D * s.entropy(T))) ** (1 / 3)
    def temperature_at(s, z):
        """T where a_0/a = 1 + z (below every step)."""
        f = lambda l: math.log(s.a_over_a0(math.exp(l)) * (1 + z))
        l = math.log(s.T0 * (1 + z)); return math.exp(brentq(f, l - 0.01, l + 0.01, xtol=1e-15, rtol=1e-15))
    def rows(s, Ts):
        """Rows of section 11 (temperatures in the order given)."""
        t = dict(zip(sorted(Ts, reverse=True), s.time(sorted(Ts, reverse=True)))); out = []
        for T in Ts:
            g = s.g(T); gb, _, _, gx = s.direct(T); m, lam = s.late(T); a, H = s.a_over_a0(T), s.H_all(T)
            r = {"temperatureGeV": T, "gRho": g[0], "gS": g[1], "gStarHalf": g[1] / math.sqrt(g[0]) * (1 + g[2]), "dLnGsDLnT": 3 * g[2],
                 "energyDensityGeV4": s.rho(T) + m + lam, "entropyDensityGeV3": s.entropy(T), "hubbleGeV": H, "timeS": t[T], "scaleFactor": a,
                 "waveFrequencyHz": a * H / (2 * math.pi) / C.HBAR, "horizonMassSolar": 4 * math.pi / 3 * (s.rho(T) + m + lam) / H**3 / C.SOLAR_MASS_GEV}
            if T < T_LATE: r.update(matterDensityGeV4=m, darkEnergyDensityGeV4=lam)
            gp = s.bath.g_p(T)
            if gp is not None:
                if s.bath.extra: gp += s.bath.apart(T, g[1])[1]
                p = math.pi**2 / 90 * gp * T**4 - lam
                if s.fluid: p += (1 + s.fluid[0]) / 3 * (s.rho(T) - s.rho_rad(T))
                r.update(pressureGeV4=p, equationOfState=p / r["energyDensityGeV4"])
                if not s.fluid and not s.bath.extra and T > max(s.bath.tdec, T_LATE): r["soundSpeedSquared"] = 1 / (3 + 3 * g[2])
            out.append(r)
        return out
    def time(s, Ts, t_hi=1e8):
        """t(T) in seconds for descending Ts: Gauss-Legendre in ln T between the breaks, from t = c/H at t_hi."""
        n = s.fluid[0] if s.fluid else 0
        t = 2 / ((4 + n) * s.H(t_hi))
        out, L = [], math.log(t_hi)
        cuts = sorted([math.log(b) for b in s.breaks + [T_LATE]], reverse=True)
        xs, ws = np.polynomial.legendre.leggauss(20)
        f = lambda l: (lambda T: (lambda g: (1 + g[2]) / s.H_all(T, g))(s.g(T)))(math.exp(l))
        for T in Ts:
            end = math.log(T)
            pts = [L] + [c for c in cuts if end < c < L] + [end]
            for a, b in zip(pts, pts[1:]):
                k = max(1, int((a - b) / 0.15) + 1)
                for i in range(k):
                    hi, lo = a - (a - b) * i / k, a - (a - b) * (i + 1) / k
                    t += (hi - lo) / 2 * sum(w * f((hi + lo) / 2 + (hi - lo) / 2 * x) for x, w in zip(xs, ws))
            L = end
            out.append(t * C.HBAR)
        return out

class EarlyMatter:
    """A decaying matter field (section 6).  rho_phi = rho_R at T_start; the equations of section 6 run both ways from there.
    State: F = ln(rho_phi a^3), S = ln(s a^3), with a = 1 (N = 0) at T_start.  T from S by inversion of s(T).
    Where the bath steps, a steps and T, F, S go on: N here leaves those steps out, ln a = N + J(T) (`real`)."""
    def __init__(s, spec, dilution=None):
        s.spec = spec
        s.rad = History({**spec, "expansion": {"kind": "radiation"}})
        e = spec["expansion"]
        s.trh = e["reheatTemperatureGeV"]
        g = s.rad.g(s.trh)[0]
        s.gamma = math.sqrt(4 * math.pi**3 * g / 45) * s.trh**2 / C.M_PL
        s.bx, s.mphi = e.get("branching", 0.0), e.get("fieldMassGeV", 1.0)
        if "startTemperatureGeV" in e: s.tst = e["startTemperatureGeV"]
        else:
            want = math.log(e["dilution"])
            F = lambda l: math.log(EarlyMatter({**spec, "expansion": {"kind": "early-matter", "reheatTemperatureGeV": s.trh,
                            "startTemperatureGeV": math.exp(l)}}).D) - want
            guess = math.log(s.trh * e["dilution"] * 1.2)
            s.tst = math.exp(brentq(F, guess - 0.7, guess + 0.7, xtol=1e-11))
        s.jumps = [(math.log(b), j) for b in s.rad.breaks for j in [math.log(s.rad.direct(b * (1 + 1e-11))[1] / s.rad.direct(b * (1 - 1e-11))[1]) / 3] if abs(j) > 1e-9]
        s.s_start = math.log(s.rad.entropy(s.tst))
        s.f_start = math.log(s.rad.rho_rad(s.tst))
        # backwards: until the entropy produced so far is below 1e-13
        def stop(N, y): return math.exp(s.rhs(N, y)[1]) - 1 - 1e-13
        s.back = s._run(0.0, [s.f_start, s.s_start], -12.0)
        s.s_early = s.back.y[1, -1]
        s.fwd = s._run(0.0, [s.f_start, s.s_start], s._end())
        s.D = math.exp(s.fwd.y[1, -1] - s.s_early)
    def _end(s):
        # well past decay: Gamma t ~ 60 in radiation starts at T ~ T_RH/12; in N from T_start the matter era lasts ~ (4/3) ln(T_start/T_RH)
        return 4 / 3 * math.log(max(s.tst / s.trh, 1.0)) + 4.0
    def J(s, L):
        """Sum of the steps of ln a between T_start and T = e^L."""
        if not s.jumps: return 0.0
        st = math.log(s.tst)
        return sum(j for b, j in s.jumps if L < b <= st) - sum(j for b, j in s.jumps if st < b <= L)
    def real(s, N, T): return N + s.J(math.log(T))
    def T_of(s, S, N):
        want = S - 3 * N - math.log(2 * math.pi**2 / 45)
        F = lambda L: float(s.rad._c(L)[1]) + 3 * L + 3 * s.J(L) - want
        L = getattr(s, "_guess", None) or (want - 4) / 3
        for _ in range(8):
            c = s.rad._c(L)
            r = c[1] + 3 * L + 3 * s.J(L) - want
            d = r / (3 + c[2])
            L -= d
            if abs(d) < 3e-15 * max(1, abs(L)): break
        else:
            L = brentq(F, (want - 5) / 3 - 3, (want - 1) / 3 + 3, xtol=1e-14, rtol=1e-14)
        s._guess = L
        return math.exp(L)
    def background(s, N, y):
        """T, H, s, rho_phi, rho_R, and dS/dN at state y."""
        T = s.T_of(y[1], N)
        a3 = math.exp(-3 * s.real(N, T))
        rf = math.exp(y[0]) * a3
        se = math.exp(y[1]) * a3
        rr = s.rad.rho_rad(T)
        H = math.sqrt(8 * math.pi * (rf + rr) / 3) / C.M_PL
        return T, H, se, rf, rr, s.gamma * rf / (H * T * se)
    def rhs(s, N, y):
        T, H, se, rf, rr, dS = s.background(N, y)
        return [-s.gamma / H, dS]
    def _run(s, a, y, b, rtol=1e-11):
        r = solve_ivp(s.rhs, (a, b), y, method="Radau", rtol=rtol, atol=1e-13, first_step=min(1e-4, abs(b - a) / 2) if a != b else None)
        assert r.success, r.message
        return r
    def report(s):
        N, y = s.fwd.t, s.fwd.y
        rat = lambda n, v: (lambda b: v[0] - 3 * s.real(n, b[0]) - math.log(b[4]))(s.background(n, v))
        vals = [rat(n, y[:, i]) for i, n in enumerate(N)]
        top = int(np.argmax(vals))
        end = s._refine(lambda n, v: rat(n, v), N, y, top)
        dbl = s._refine(lambda n, v: s.s_early + math.log(2) - v[1], N, y, 0)
        return {"dilution": s.D, "startTemperatureGeV": s.tst, "gammaPhiGeV": s.gamma, "lifetimeS": C.HBAR / s.gamma,
                "temperatureSecondEqualityGeV": end, "temperatureEntropyDoubledGeV": dbl,
                "maximumMatterFraction": float(1 / (1 + math.exp(-max(vals)))),
                "startTemperatureEntropyExcess": math.expm1(s.s_start - s.s_early)}
    def rows(s, Ts):
        """Rows at Ts (descending, not above about 20 T_start): t from 1/(2H) at N = -12; a/a_0 from the solved s a^3."""
        H0 = s.background(s.back.t[-1], s.back.y[:, -1])[1]
        f = lambda N, y: [*s.rhs(N, y[:2]), 1 / (s.background(N, y[:2])[1] * math.exp(y[2]))]
        run = lambda a, y, b: solve_ivp(f, (a, b), y, method="Radau", rtol=1e-11, atol=1e-13, first_step=min(1e-4, (b - a) / 2))
        r = run(s.back.t[-1], [*s.back.y[:, -1], -math.log(2 * H0)], s._end())
        T = [s.background(n, r.y[:2, i])[0] for i, n in enumerate(r.t)]; out = []
        for want in Ts:
            k = next(i for i in range(len(T) - 1) if T[i] > want >= T[i + 1])
            at = lambda n: r.y[:, k] if n == r.t[k] else run(r.t[k], r.y[:, k], n).y[:, -1]
            n = brentq(lambda n: math.log(s.background(n, at(n)[:2])[0] / want), r.t[k], r.t[k + 1], xtol=1e-13)
            y = at(n); _, H, se, rf, rr, _ = s.background(n, y[:2]); g = s.rad.g(want)
            a = math.exp(s.real(n, want)) * (s.rad.s0 / math.exp(s.fwd.y[1, -1])) ** (1 / 3)
            out.append({"temperatureGeV": want, "gRho": g[0], "gS": g[1], "energyDensityGeV4": rf + rr, "fieldDensityGeV4": rf, "entropyDensityGeV3": se,
                        "hubbleGeV": H, "timeS": math.exp(y[2]) * C.HBAR, "scaleFactor": a, "waveFrequencyHz": a * H / (2 * math.pi) / C.HBAR})
        return out
    def _refine(s, f, N, y, k0):
        """Temperature at which f(N, y) falls through zero after step k0, by restarting the solver from the step before."""
        k = next((i for i in range(k0, len(N) - 1) if f(N[i], y[:, i]) > 0 >= f(N[i + 1], y[:, i + 1])), None)
        if k is None: return None
        def at(n):
            if n == N[k]: return y[:, k]
            return s._run(N[k], y[:, k], n).y[:, -1]
        n = brentq(lambda n: f(n, at(n)), N[k], N[k + 1], xtol=1e-11)
        return s.T_of(at(n)[1], n)

class MatterFromVacuum:
    """Variant for T_max: at N = 0 only the field, H = H_start, no radiation (extension: expansion.startHubbleGeV)."""
    def __init__(s, spec):
        e = spec["expansion"]
        s.rad = History({**spec, "expansion": {"kind": "radiation"}})
        g = s.rad.g(e["reheatTemperatureGeV"])[0]
        s.gamma = math.sqrt(4 * math.pi**3 * g / 45) * e["reheatTemperatureGeV"] ** 2 / C.M_PL
        h = e["startHubbleGeV"]
        s.rphi = 3 * h**2 * C.M_PL**2 / (8 * math.pi)
        em = EarlyMatter.__new__(EarlyMatter); em.rad = s.rad; em.gamma = s.gamma; em.jumps = []
        # start from the exact early growth: rho_R = Gamma rho_phi N/H for small N, d(rho_R)/dN = Gamma rho_phi/H
        n0 = 1e-7
        r0 = s.gamma * s.rphi / h * n0
        T0 = brentq(lambda l: math.log(s.rad.rho_rad(math.exp(l))) - math.log(r0), math.log(1e-10), math.log(1e15), xtol=1e-14)
        T0 = math.exp(T0)
        y0 = [math.log(s.rphi) - s.gamma / h * n0, math.log(s.rad.entropy(T0)) + 3 * n0]
        r = solve_ivp(em.rhs, (n0, 2.0), y0, method="Radau", rtol=1e-11, atol=1e-13, dense_output=True, first_step=1e-9)
        slope = lambda n: em.rhs(n, r.sol(n))[1] - 3
        k = next(i for i in range(len(r.t) - 1) if slope(r.t[i]) > 0 >= slope(r.t[i + 1]))
        n = brentq(slope, r.t[k], r.t[k + 1], xtol=1e-12)
        s.report = {"gammaPhiGeV": s.gamma, "maximumTemperatureOfEraGeV": em.T_of(r.sol(n)[1], n),
                    "scaleFactorAtMaximum": math.exp(n)}
