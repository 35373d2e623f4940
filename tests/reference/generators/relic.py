"""Relic abundances (the conventions, section 7).  abundance(input) takes the wire JSON of section 11 and returns the outputs.

Freeze-out is solved for ln Y in ln x: Radau (rtol 1e-11), restarted at every jump or kink of the bath; a second method is
DOP853 (explicit, order 8, rtol 1e-12) from the point where the annihilation rate is 3000 H, with Y = Y_eq there; from zero
abundance the second method is BDF in Y itself.  A parent that annihilates and decays is solved with its product (Radau, BDF).
Freeze-in without back-reaction is a quadrature (Gauss-Legendre in ln T between the breaks); second method: Radau.
"""
import math
import numpy as np
from scipy.integrate import solve_ivp
from scipy.optimize import brentq
import constants as C
from species import ideal, ETA
from history import History, EarlyMatter, Piecewise
from rates import Rate, kve, loglog, scattering_rate

RTOL, ATOL = 1e-11, 1e-13

def bessel_sum(x, eta):
    """sum_k (-eta)^{k+1} K1(k x)/k by the integral (1/x) Int f(u) u^2/E du /..., i.e. 2 pi^2 I1/x (exact for all x)."""
    if eta == 0: return float(kve(1, x) * math.exp(-x))
    return float(2 * math.pi**2 * ideal(x, eta)[2][0] / x)

def n_eq(T, m, g, eta):
    if eta == 0: return g * m * m * T / (2 * math.pi**2) * float(kve(2, m / T)) * math.exp(-m / T)
    return g * T**3 * float(ideal(m / T, eta)[0][0])

class Candidate:
    """Equilibrium number and annihilation factor of a candidate (or parent)."""
    def __init__(s, c, key="annihilation"):
        s.m = c["massGeV"]
        s.rate = Rate(c, key) if key in c else None
        s.half = 1.0 if c.get("selfConjugate", True) or (s.rate and s.rate.species) else 0.5
        mb = c.get("equilibriumStatistics", "exact") == "maxwell-boltzmann"
        sp = (s.rate.species if s.rate and s.rate.species else None) or [c]
        s.sp = [(q["massGeV"], q["degreesOfFreedom"], 0 if mb else ETA[q["statistics"]]) for q in sp]
    def neq(s, T):
        return sum(n_eq(T, *q) for q in s.sp)
    def log_neq_table(s, x_hi=700.0):
        """ln(n_eq e^x / m^3) as an interpolant in ln x, 1e-5 <= x <= x_hi (the sources fall below 1e-300 after)."""
        def f(l):
            x = math.exp(l); T = s.m / x; tot = 0.0
            for m, g, eta in s.sp:
                z = m / T
                if z > 40: v = g * m * m * T / (2 * math.pi**2) * float(kve(2, z)) * math.exp(-(z - x)); tot += v
                else: tot += n_eq(T, m, g, eta) * math.exp(x)
            return np.array([math.log(tot / s.m**3)])
        p = Piecewise(f, math.log(1e-5), math.log(x_hi))
        return lambda x: float(p(math.log(x))[0]) - x if x < x_hi else -1e4

def _segments(h, m, x0, x1):
    pts = [m / b for b in h.breaks if x0 * (1 + 1e-9) < m / b < x1 * (1 - 1e-9)]
    return sorted([x0, x1, *pts])

def freeze_out(h, cand, x0=1.0, method="radau", rtol=RTOL, initial="equilibrium", x_end=None, at=()):
    """at: values of x where Y is wanted too (output `samples`: [x, Y, Y_eq]; Y_eq itself before the start)."""
    m, rate = cand.m, cand.rate
    lneq = cand.log_neq_table()
    x_end = x_end or m / h.T0
    ln_m3 = 3 * math.log(m)
    D = math.log(h.exp["factor"]) if h.exp["kind"] == "entropy-step" else 0
    xD = m / h.exp["temperatureGeV"] if D else None
    def coef(x):
        T = m / x; g = h.g(T)
        s = 2 * math.pi**2 / 45 * g[1] * T**3
        return s, s * (1 + g[2]) / h.H(T, g) * rate(x) * cand.half
    def lyeq(x): return lneq(x) + ln_m3 - math.log(h.entropy(m / x))
    def rhs(N, y):
        x = math.exp(N); s, k = coef(x)
        ly = lneq(x) + ln_m3 - math.log(s)
        Y = math.exp(min(y[0], 50))
        return [-k * (Y - math.exp(min(2 * ly - y[0], 300)))]
    def jac(N, y):
        x = math.exp(N); s, k = coef(x)
        ly = lneq(x) + ln_m3 - math.log(s)
        return [[-k * (math.exp(min(y[0], 50)) + math.exp(min(2 * ly - y[0], 300)))]]
    if h.tmax and m / h.tmax > x0: x0 = m / h.tmax
    # start where Gamma/H falls for the last time through 1e6 (second method: 3000); Y = Y_eq there to 1e-6, forgotten at once
    if initial == "equilibrium":
        f = lambda N: math.log(coef(math.exp(N))[1]) + lyeq(math.exp(N)) - math.log(3000.0 if method == "dop853" else 1e6)
        Ns = np.linspace(math.log(x0), math.log(650.0), 300)
        k = next((i for i in range(298, -1, -1) if f(Ns[i]) > 0), None)
        if k is not None: x0 = math.exp(brentq(f, Ns[k], Ns[k + 1]))
    linear = initial == "zero" and method != "radau"
    def rhs_linear(N, y):
        x = math.exp(N); s, k = coef(x)
        return [-k * (y[0] ** 2 - math.exp(2 * (lneq(x) + ln_m3 - math.log(s))))]
    y = [lyeq(x0)]
    if initial == "zero":                                        # the first stretch in Y itself, in units of what it reaches
        step = min([0.05] + [math.log(m / b / x0) / 2 for b in h.breaks if m / b > x0 * (1 + 1e-9)])
        k0, q0 = coef(x0)[1], math.exp(lyeq(x0)); u = min(step * k0 * q0, 1.0) * q0
        r = solve_ivp(lambda N, y: [v / u for v in rhs_linear(N, [y[0] * u])], (math.log(x0), math.log(x0) + step), [0.0], method="Radau",
                      rtol=1e-12, atol=1e-14, jac=lambda N, y: [[-2 * y[0] * u * coef(math.exp(N))[1]]], first_step=min(1e-6, 0.01 * step / max(step * k0 * q0, 1.0)))
        assert r.success, r.message
        x0, y = x0 * math.exp(step), [float(r.y[0, -1]) * u if linear else math.log(r.y[0, -1] * u)]
    xs = _segments(h, m, x0, x_end)
    xf = None; samples = [[x, math.exp(lyeq(x)), math.exp(lyeq(x))] for x in at if x < x0]
    eps = 1e-12
    for a, b in zip(xs, xs[1:]):
        if xD and abs(a / xD - 1) < 1e-12: y = [y[0] * math.exp(-D) if linear else y[0] - D]
        A, B = math.log(a) + eps * max(1, abs(math.log(a))), math.log(b) - eps * max(1, abs(math.log(b)))
        gap = lambda N, v: v[0] - lyeq(math.exp(N)) - math.log(2.5)
        kw = dict(method="Radau", jac=jac) if method == "radau" else dict(method="DOP853")
        kw["first_step"] = min(1e-5, (B - A) / 4)
        if linear:
            r = solve_ivp(rhs_linear, (A, B), y, method="BDF", rtol=1e-12, atol=1e-60, first_step=min(1e-5, (B - A) / 4),
                          jac=lambda N, y: [[-2 * y[0] * coef(math.exp(N))[1]]])
            assert r.success, r.message
            y = [float(r.y[0, -1])]; continue
        r = solve_ivp(rhs, (A, B), y, rtol=rtol if method == "radau" else 1e-12, atol=ATOL, events=None if xf else [gap], dense_output=bool(len(at)), **kw)
        assert r.success, r.message
        if xf is None and len(r.t_events[0]) and (initial == "equilibrium"): xf = math.exp(r.t_events[0][0])
        samples += [[x, math.exp(r.sol(min(max(math.log(x), A), B))[0]), math.exp(lyeq(x))] for x in at if a <= x < b]
        y = [float(r.y[0, -1])]
    out = {"yieldToday": y[0] if linear else math.exp(y[0])}
    if xf:
        # sharpen x_f: the event is on the dense output; solve again up to it is not needed at 1e-7
        out.update(freezeOutX=xf, freezeOutTemperatureGeV=m / xf, sigmaVAtFreezeOutCm3PerS=rate(xf) / C.CM3_PER_S,
                   rateOverHubbleAtFreezeOut=n_eq_rate(h, cand, xf))
    if len(at): out["samples"] = samples
    return out

def n_eq_rate(h, cand, x):
    """n_eq <sigma v>/H (n_eq the sum over particle and antiparticle, no factor one half)."""
    T = cand.m / x
    return cand.neq(T) * cand.rate(x) / h.H(T)

def freeze_out_matter(em, cand, x0=1.0, method="radau", rtol=1e-10):
    """Freeze-out in the decaying-matter expansion: joint system (F, S, ln Y) in N = ln a, Y = n/s."""
    m, rate = cand.m, cand.rate
    lneq = cand.log_neq_table()
    # initial N: temperature m/x0 on the backward branch or the forward one
    T0 = m / x0
    S, F, N = em.s_start, em.f_start, 0.0
    if T0 > em.tst: rng, y0 = -12.0, [F, S]
    else: rng, y0 = em._end(), [F, S]
    ev = lambda n, y: math.log(em.background(n, y)[0] / T0)
    ev.terminal = True
    r = solve_ivp(em.rhs, (0, rng), y0, method="Radau", rtol=1e-12, atol=1e-13, first_step=1e-5, events=[ev])
    N0, F0, S0 = r.t[-1], *r.y[:, -1]
    N0b = N0
    T1 = em.background(N0, [F0, S0])[0]
    def parts(N, y):
        T, H, se, rf, rr, dS = em.background(N, y)
        x = m / T
        ly = lneq(x) + 3 * math.log(m) - math.log(se)
        k = se / H * rate(x) * cand.half
        return T, H, se, rf, dS, ly, k
    def rhs(N, y):
        T, H, se, rf, dS, ly, k = parts(N, y)
        prod = em.bx * em.gamma * rf / (em.mphi * se * H) * math.exp(-y[2]) if em.bx else 0.0
        return [-em.gamma / H, dS, -k * (math.exp(y[2]) - math.exp(min(2 * ly - y[2], 300))) - dS + prod]
    ly0 = lneq(m / T1) + 3 * math.log(m) - math.log(em.background(N0, [F0, S0])[2])
    end = math.log(em.rad.entropy(em.tst)) / 3 - math.log(em.rad.entropy(em.rad.T0)) / 3 + math.log(em.D) / 3
    kw = dict(method="Radau") if method == "radau" else dict(method="BDF")
    gap = lambda n, y: y[2] - parts(n, y)[5] - math.log(2.5)
    mid = em._end()
    r = solve_ivp(rhs, (N0, mid), [F0, S0, ly0], rtol=rtol if method == "radau" else 1e-12, atol=1e-13, first_step=1e-8, events=[gap], **kw)
    assert r.success, r.message
    # after the decays (Gamma t > 100) the ordinary radiation equation
    T, Y = em.background(r.t[-1], r.y[:, -1])[0], math.exp(r.y[2, -1])
    h = em.rad
    tail = freeze_tail(h, cand, m / T, Y)
    out = {"yieldToday": tail, "dilution": em.D}
    if len(r.t_events[0]):
        Tf = em.background(r.t_events[0][0], r.y_events[0][0])[0]
        out.update(freezeOutX=m / Tf, freezeOutTemperatureGeV=Tf)
    return out

def freeze_tail(h, cand, x, Y):
    """From x on, with Y_eq negligible: 1/Y' = 1/Y + Int s<sv>/H (1+delta) dln x, by quadrature."""
    m = cand.m
    def f(L):
        T = math.exp(L); g = h.g(T)
        return 2 * math.pi**2 / 45 * g[1] * T**3 * (1 + g[2]) / h.H(T, g) * cand.rate(m / T) * cand.half
    return 1 / (1 / Y + _quad(f, h, h.T0, m / x))

LG = np.polynomial.legendre.leggauss(24)
def _quad(f, h, lo, hi, step=0.4):
    cuts = sorted({math.log(lo), math.log(hi), *[math.log(b) for b in h.breaks if lo < b < hi]})
    tot = 0.0
    for a, b in zip(cuts, cuts[1:]):
        n = max(1, int((b - a) / step) + 1)
        for i in range(n):
            p, q = a + (b - a) * i / n, a + (b - a) * (i + 1) / n
            tot += (q - p) / 2 * sum(w * f((p + q) / 2 + (q - p) / 2 * z) for z, w in zip(*LG))
    return tot

def freeze_in(h, gamma, scale, yeq=None, t_lo=None, method="quad", y0=0.0, t_hi=None, power=1, cuts=()):
    """dY/dln T = -gamma (1+delta)/(s H) [1 - (Y/Y_eq)^power].  gamma(T) in GeV^4; scale = mass that sets the range."""
    t_hi = h.tmax or t_hi or 1e5 * scale
    t_lo = t_lo or scale / 650
    D, TD = (h.exp["factor"], h.exp["temperatureGeV"]) if h.exp["kind"] == "entropy-step" else (1, 0)
    def f(L):
        T = math.exp(L); g = h.g(T)
        return gamma(T) * (1 + g[2]) / (2 * math.pi**2 / 45 * g[1] * T**3 * h.H(T, g)) / (D if T > TD else 1)
    if yeq is None and method == "quad": return y0 + _quad(f, h, t_lo, t_hi, 0.3)
    y = y0
    cuts = sorted({math.log(t_lo), math.log(t_hi), *[math.log(b) for b in h.breaks if t_lo < b < t_hi]}, reverse=True)
    tot = _quad(f, h, t_lo, t_hi, 0.3)
    for a, b in zip(cuts, cuts[1:]):
        F = lambda N, y: [f(-N) * (1 - (abs(y[0]) / yeq(math.exp(-N))) ** power if yeq else 1)]
        e = 1e-13 * max(1, abs(a), abs(b))
        alt = yeq is not None and method == "ode"
        r = solve_ivp(F, (-a + e, -b - e), [y], method="BDF" if alt else "Radau", first_step=1e-6 * (a - b),
                      rtol=1e-12 if alt else 1e-10, atol=1e-14 * tot)
        assert r.success
        y = float(r.y[0, -1])
    return y

def freeze_in_matter(em, gamma, scale, y0=0.0, rtol=1e-10, method="Radau"):
    """Freeze-in in the decaying-matter expansion, from T = T_hi = 3e3*scale (or the start of the radiation era before)."""
    h = em.rad
    T0 = h.tmax or 3e3 * scale
    if T0 > em.tst: rng = -12.0
    else: rng = em._end()
    ev = lambda n, y: math.log(em.background(n, y)[0] / T0)
    ev.terminal = True
    r = solve_ivp(em.rhs, (0, rng), [em.f_start, em.s_start], method="Radau", rtol=1e-12, atol=1e-13, first_step=1e-5, events=[ev])
    N0, st = r.t[-1], list(r.y[:, -1])
    # X = n a^3 in units that make it O(1): divide by S_early
    sc = math.exp(em.s_early)
    def rhs(N, y):
        T, H, se, rf, rr, dS = em.background(N, y)
        g = gamma(T) if T > scale / 650 else 0.0
        return [-em.gamma / H, dS, (g + em.bx * em.gamma * rf / em.mphi) * math.exp(3 * em.real(N, T)) / H / sc]
    n_end = em._end()
    r = solve_ivp(rhs, (N0, n_end), st + [0.0], method=method, rtol=rtol if method == "Radau" else 1e-12, atol=[1e-13, 1e-13, 1e-22], first_step=1e-6)
    assert r.success
    T, H, se, *_ = em.background(r.t[-1], r.y[:2, -1])
    Y = r.y[2, -1] * sc / math.exp(r.y[1, -1])
    # whatever is produced after the decays
    f = lambda L: (lambda T, g: gamma(T) * (1 + g[2]) / (2 * math.pi**2 / 45 * g[1] * T**3 * h.H(T, g)))(math.exp(L), h.g(math.exp(L)))
    if scale / 650 < T: Y += _quad(f, h, scale / 650, T, 0.3)
    return Y

def parent_evolution(h, cand, width, per_decay, method="Radau", initial="equilibrium"):
    """A parent with annihilation and decay, and its product: ln Y_B and Y_X in ln x, until Y_B is e^-45 of Y_X."""
    m, rate = cand.m, cand.rate
    lneq, ln_m3 = cand.log_neq_table(), 3 * math.log(cand.m)
    D, xD = (h.exp["factor"], m / h.exp["temperatureGeV"]) if h.exp["kind"] == "entropy-step" else (1, None)
    def parts(x):
        T = m / x; g = h.g(T); s = 2 * math.pi**2 / 45 * g[1] * T**3; q = (1 + g[2]) / h.H(T, g)
        return s * q * rate(x) * cand.half, width * q * float(kve(1, x) / kve(2, x)), lneq(x) + ln_m3 - math.log(s)
    x0 = m / h.tmax if h.tmax else 1e-4
    k, d, ly = parts(x0)
    y = [ly, 0.0 if h.tmax else d * math.exp(ly) / 3]                   # Y_X grows as x^3 at first
    unit = 1e-3 * d * math.exp(ly) / x0**3 if x0 < 1e-2 else math.exp(ly) * min(1.0, d)
    y[1] /= unit
    def rhs(N, y):
        k, d, l = parts(math.exp(N)); Y = math.exp(y[0])
        return [-k * (Y - math.exp(min(2 * l - y[0], 300))) - d, per_decay * d * Y / unit]
    def jac(N, y):
        k, d, l = parts(math.exp(N)); Y = math.exp(y[0])
        return [[-k * (Y + math.exp(min(2 * l - y[0], 300))), 0.0], [per_decay * d * Y / unit, 0.0]]
    y[1] *= per_decay
    if method == "BDF":                                          # from where annihilation falls to 1e7 H; before, Y_B to first order in 1/rate
        def near(x):
            k, d, l = parts(x); e = 1e-4
            return math.exp(l) * (1 - ((parts(x * math.exp(e))[2] - parts(x * math.exp(-e))[2]) / (2 * e) + d) / (2 * k * math.exp(l))), d
        f = lambda N: (lambda p: math.log(p[0]) + p[2] - math.log(1e7))(parts(math.exp(N)))
        if f(math.log(x0)) > 0 and not h.tmax:
            xs = math.exp(brentq(f, math.log(x0), math.log(600.0)))
            if not xD or xD > xs:
                y[1] += per_decay / unit * _quad(lambda L: (lambda q: q[0] * q[1])(near(m / math.exp(L))), h, m / xs, m / x0, 0.2)
                x0, y[0] = xs, math.log(near(xs)[0])
    end = lambda N, y: y[0] + 45 - math.log(max(y[1] * unit, 1e-300))
    end.terminal, end.direction = True, -1
    xs = _segments(h, m, x0, m / h.T0)
    for a, b in zip(xs, xs[1:]):
        if xD and abs(a / xD - 1) < 1e-12: y = [y[0] - math.log(D), y[1] / D]
        A, B = math.log(a), math.log(b); e = 1e-12 * max(1, abs(A)); A += e; B -= e
        r = solve_ivp(rhs, (A, B), y, method=method, jac=jac, rtol=RTOL if method == "Radau" else 1e-12, atol=[ATOL, ATOL],
                      first_step=min(1e-6, (B - A) / 4), events=[end])
        assert r.success, r.message
        y = [float(v) for v in r.y[:, -1]]
        if len(r.t_events[0]):
            if xD and math.exp(r.t[-1]) < xD: y[1] /= D
            break
    return y[1] * unit

def parent_evolution_matter(em, cand, width, per_decay, method="Radau"):
    """The same in the decaying-matter expansion: F, S, ln(n_B a^3/S_early), n_X a^3/S_early in N = ln a, from T = 200 m_B down."""
    m, rate, sc = cand.m, cand.rate, em.s_early
    lneq, ln_m3 = cand.log_neq_table(), 3 * math.log(cand.m)
    T0 = 200 * m
    ev = lambda n, y: math.log(em.background(n, y)[0] / T0)
    ev.terminal = True
    r = solve_ivp(em.rhs, (0, -12.0 if T0 > em.tst else em._end()), [em.f_start, em.s_start], method="Radau", rtol=1e-12, atol=1e-13, first_step=1e-5, events=[ev])
    N0 = r.t[-1]
    def parts(N, y):
        T, H, se, rf, rr, dS = em.background(N, y); x = m / T
        return H, dS, math.exp(y[2] + sc - 3 * em.real(N, T)), lneq(x) + ln_m3, rate(x) * cand.half / H, width / H * float(kve(1, x) / kve(2, x))
    def rhs(N, y):
        H, dS, n, lq, k, d = parts(N, y)
        return [-em.gamma / H, dS, -k * (n - math.exp(2 * lq) / n) - d, per_decay * d * math.exp(y[2])]
    y = [*r.y[:, -1], 0.0, 0.0]
    T1 = em.background(N0, y)[0]
    y[2] = lneq(m / T1) + ln_m3 - sc + 3 * em.real(N0, T1)
    y[3] = parts(N0, y)[5] * math.exp(y[2]) / 3 * per_decay
    end = lambda N, y: y[2] + 45 - math.log(max(y[3], 1e-300))
    end.terminal, end.direction = True, -1
    r = solve_ivp(rhs, (N0, em._end()), y, method=method, rtol=1e-10 if method == "Radau" else 1e-12, atol=[1e-13, 1e-13, 1e-13, 1e-12 * y[3]], first_step=1e-8, events=[end])
    assert r.success and len(r.t_events[0]), "the parent outlives the matter era"
    return r.y[3, -1] * math.exp(sc - em.fwd.y[1, -1])

def omega(h, m, Y): return m * Y * h.s0 / C.RHO_C

# ---- the wire -------------------------------------------------------------------------------------------------------
_cache = {}
def history_of(spec):
    import json
    k = json.dumps(spec, sort_keys=True)
    if k not in _cache:
        _cache[k] = EarlyMatter(spec) if spec.get("expansion", {}).get("kind") == "early-matter" else History(spec)
    return _cache[k]

def abundance(inp, second=False):
    """Outputs for one input; second=True uses the second method where there is one."""
    H, c = inp["history"], inp["candidate"]
    h = history_of(H)
    em = h if isinstance(h, EarlyMatter) else None
    rad = em.rad if em else h
    m = c["massGeV"]
    out = {}
    k = c["mechanism"]
    if k == "freeze-out":
        cand = Candidate(c)
        x0 = c.get("startX", 1.0)
        init = c.get("initialAbundance", "equilibrium")
        if em: out = freeze_out_matter(em, cand, x0, "bdf" if second else "radau")
        else: out = freeze_out(h, cand, x0, "dop853" if second else "radau", initial=init)
    elif k == "freeze-in-decay":
        p = c["parent"]
        G = p["widthGeV"] if "widthGeV" in p else C.HBAR / p["lifetimeS"]
        mB, gB, eta, nx = p["massGeV"], p["degreesOfFreedom"], ETA[p["statistics"]], c.get("perDecay", 1)
        gamma = lambda T: nx * gB * mB**2 * T * G / (2 * math.pi**2) * bessel_sum(mB / T, eta)
        yeq = None
        if c.get("backReaction"):
            yeq = lambda T: n_eq(T, m, c["degreesOfFreedom"], ETA[c["statistics"]]) / rad.entropy(T)
        if em: Y = freeze_in_matter(em, gamma, mB, method="BDF" if second else "Radau")
        else: Y = freeze_in(h, gamma, mB, yeq, method="ode" if second else "quad", power=nx)
        out = {"yieldToday": Y, "yieldFreezeIn": Y, "lifetimeS": C.HBAR / G, "widthGeV": G}
        if "annihilation" in p and c.get("lateDecay", True):
            par = Candidate({**p, "mechanism": "freeze-out"})
            fo = freeze_out_matter(em, par) if em else freeze_out(h, par, method="dop853" if second else "radau")
            out["parentFreezeOut"] = {**fo, "omegaH2IfStable": omega(rad, mB, fo["yieldToday"])}
            if not em and "freezeOutTemperatureGeV" in fo: out["parentFreezeOut"]["widthOverHubble"] = G / h.H(fo["freezeOutTemperatureGeV"])
            out["yieldLateDecay"] = nx * fo["yieldToday"]
            out["yieldToday"] = (parent_evolution_matter if em else parent_evolution)(em or h, par, G, nx, "BDF" if second else "Radau")
        if em: out["dilution"] = em.D
    elif k == "freeze-in-scattering":
        q = c["scattering"]
        scale = m
        if q["kind"] == "constant-matrix-element":
            M2 = q["matrixElementSquared"]
            gamma = lambda T: M2 * m * T**3 * float(kve(1, m / T)) * math.exp(-m / T) / (128 * math.pi**5)
        else:
            if q["kind"] == "table": sigma, knots = loglog(q["points"]), [r for r, _ in q["points"]]
            else: sigma, knots = (lambda r: q["crossSectionGeVMinus2"] * (r / q["referenceEnergyGeV"]) ** q["exponent"]), ()
            scale = max(m, sum(i["massGeV"] for i in q["incoming"]))
            gamma = lambda T: scattering_rate(T, sigma, q["incoming"], m, knots)
            if em:                                           # many calls: an interpolant
                tab = Piecewise(lambda L: np.array([math.log(scattering_rate(math.exp(L), sigma, q["incoming"], m, knots, True))]), math.log(scale / 700), math.log(4e3 * scale))
                gamma = lambda T: math.exp(float(tab(math.log(T))[0]) - scale / T)
        if em: Y = freeze_in_matter(em, gamma, scale, method="BDF" if second else "Radau")
        else: Y = freeze_in(h, gamma, scale, method="ode" if second else "quad", t_hi=9e15)
        out = {"yieldToday": Y}
        if em: out["dilution"] = em.D
    elif k == "freeze-in-ultraviolet":
        u = c["ultraviolet"]
        q, Cc, Lam = u["index"], u["coefficient"], u["scaleGeV"]
        gamma = lambda T: Cc * T ** (2 * q + 4) / Lam ** (2 * q)
        Y = freeze_in(h, gamma, h.tmax, t_lo=h.T0, method="ode" if second else "quad")
        out = {"yieldToday": Y}
    elif k == "asymmetric":
        cand = Candidate(c)
        out = asymmetric(h, cand, c["asymmetry"], "DOP853" if second else "Radau")
    elif k == "hot-relic":
        Td = c["decouplingTemperatureGeV"]
        Y = n_eq(Td, m, c["degreesOfFreedom"], ETA[c["statistics"]]) / rad.entropy(Td)
        out = {"yieldToday": Y}
    else: raise ValueError(k)
    out["omegaH2"] = omega(rad, m, out["yieldToday"])
    return out

def asymmetric(h, cand, eta, method="Radau"):
    """Y+ - Y- = eta; Y_eq is that of the particle alone: half of degreesOfFreedom (which counts both)."""
    m, rate = cand.m, cand.rate
    lneq = cand.log_neq_table()
    def parts(x):
        T = m / x; g = h.g(T); s = 2 * math.pi**2 / 45 * g[1] * T**3
        return s * (1 + g[2]) / h.H(T, g) * rate(x), lneq(x) + 3 * math.log(m) - math.log(s) - math.log(2)
    def rhs(N, y):
        k, l = parts(math.exp(N))
        return [-k * (math.exp(y[0]) + eta - math.exp(min(2 * l - y[0], 300)))]
    def start(x):
        q = math.exp(parts(x)[1]); a = math.asinh(eta / 2 / q); return math.log(q) - a
    x0 = 1.0
    if method == "DOP853":
        f = lambda N: (lambda p: math.log(p[0]) + np.logaddexp(p[1], math.log(eta + 1e-300)) - math.log(3000.0))(parts(math.exp(N)))
        hi = math.log(600.0)
        x0 = math.exp(brentq(f, 0, hi)) if f(0) > 0 > f(hi) else 1.0
    y = [start(x0)]
    xs = _segments(h, m, x0, m / h.T0)
    for a, b in zip(xs, xs[1:]):
        A, B = math.log(a) + 1e-12, math.log(b) - 1e-12
        r = solve_ivp(rhs, (A, B), y, method=method, first_step=min(1e-5, (B - A) / 4), rtol=1e-11 if method == "Radau" else 1e-12, atol=1e-12)
        assert r.success, r.message
        y = [float(r.y[0, -1])]
    ym = math.exp(y[0])
    return {"yieldToday": eta + 2 * ym, "yieldAntiparticle": ym, "yieldParticle": eta + ym}
