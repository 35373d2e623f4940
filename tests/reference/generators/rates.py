"""Thermally averaged cross sections (the conventions, section 7), in GeV^-2, as functions of x = m/T."""
import math
import numpy as np
from scipy.special import kve as _kve
import constants as C
from history import Piecewise

def kve(n, z):
    """e^z K_n(z); asymptotic series above 2000 (scipy's routine loses digits, then returns nan, for very large z)."""
    z = np.asarray(z, float)
    big = z > 2000
    if not np.any(big): return _kve(n, z)
    mu, t, tot = 4.0 * n * n, np.ones_like(z), np.ones_like(z)
    for k in range(1, 9):
        t = t * (mu - (2 * k - 1) ** 2) / (k * 8 * z)
        tot = tot + t
    return np.where(big, np.sqrt(np.pi / (2 * z)) * tot, _kve(n, np.where(big, 1.0, z)))

LG = np.polynomial.legendre.leggauss(40)

def _glq(f, cuts):
    tot = 0.0
    for a, b in zip(cuts, cuts[1:]):
        x = (a + b) / 2 + (b - a) / 2 * LG[0]
        tot += (b - a) / 2 * float(LG[1] @ f(x))
    return tot

def resonance_average(x, m, mr, gr, prefactor):
    """<sigma v> of a Breit-Wigner: sigma (s-4m^2) = 16 pi omega M^2 G^2 B/((s-M^2)^2+M^2G^2), prefactor = (1 + delta) 16 pi omega B.
    The integral runs in theta, s = M^2 + M Gamma tan(theta), near the peak, and in y = (sqrt(s)-2m)/T elsewhere."""
    T = m / x
    k2 = kve(2, x)
    # sqrt(s) K1(sqrt(s)/T) / K2(x)^2, with the exponentials taken out: e^{-(sqrt(s)/T - 2x)}
    def body(s, y=None):
        r = np.sqrt(s)
        return r * kve(1, r / T) * np.exp(-((r - 2 * m) / T if y is None else y)) / k2**2
    mg = mr * gr
    D = lambda s: mg**2 / ((s - mr**2) ** 2 + mg**2)
    rs = lambda y: (2 * m + y * T) ** 2                      # y from 0 to 60
    ypk = (mr - 2 * m) / T
    yend = 60.0
    tot = 0.0
    f_y = lambda y: body(rs(y), y) * D(rs(y)) * 2 * (2 * m + y * T) * T
    # window of the peak in sqrt(s): half-width w, in units of T at most 0.5 and at least many widths
    w = max(min(0.5, 0.25 * mr / T), 1e-300)
    lo, hi = max(0.0, ypk - w), min(yend, ypk + w)
    if hi > 0 and lo < yend:
        th = lambda y: math.atan2(rs(y) - mr**2, mg)
        def f_t(t):
            s = mr**2 + mg * np.tan(t)
            return mg * body(s)
        a, b = th(lo), th(hi)
        # beyond +-atan(1e4) the tangent is too steep: log-spaced cuts in distance from the pole
        def cuts(a, b):
            d = [0.0]
            for k in np.arange(0, 40, 0.35):
                d.append(10**k * 1e-1)
            pts = sorted({a, b, *[p for q in d for p in (math.atan(q), -math.atan(q)) if a < p < b]})
            return pts
        # far parts are done in u = ln|s - M^2| instead of theta (tan loses digits near +-pi/2)
        lim = math.atan(100.0)
        aa, bb = max(a, -lim), min(b, lim)
        if bb > aa: tot += _glq(f_t, cuts(aa, bb))
        for sgn, z0, z1 in ((1, max(100.0 * mg, (rs(lo) - mr**2)), rs(hi) - mr**2),
                            (-1, max(100.0 * mg, mr**2 - rs(hi)), mr**2 - rs(lo))):
            if z1 > z0 > 0:
                g = lambda u: (lambda z: body(mr**2 + sgn * z) * D(mr**2 + sgn * z) * z)(np.exp(u))
                n = max(1, int(math.log(z1 / z0) / 0.8) + 1)
                tot += _glq(g, list(np.linspace(math.log(z0), math.log(z1), n + 1)))
        out = [(0.0, lo), (hi, yend)]
    else: out = [(0.0, yend)]
    for a, b in out:
        if b > a:
            # geometric cuts away from the pole and away from the threshold
            pts = {a, b, *[p for p in np.arange(1, 60, 2.0) if a < p < b]}
            for k in np.geomspace(1e-3, 60, 24):
                for p in (k, ypk + k, ypk - k):
                    if a < p < b: pts.add(p)
            tot += _glq(f_y, sorted(pts))
    return prefactor / (8 * m**4 * T) * tot

def coulomb_average(x, alpha):
    """<S> of the s-wave Coulomb factor; v = 2w/sqrt(x), weight w^2 e^{-w^2}; double-exponential quadrature in w."""
    h = 1 / 20
    t = np.arange(-90, 50) * h
    w = np.exp(t - np.exp(-t)); dw = w * (1 + np.exp(-t)) * h
    z = math.pi * alpha * math.sqrt(x) / w
    S = z / -np.expm1(-z)
    return 4 / math.sqrt(math.pi) * float((w * w * np.exp(-w * w) * S) @ dw)

def hulthen_factor(v, alpha, eps):
    """S(v) of the Hulthen potential, eps = pi^2 m_phi/(6 alpha m); exponentials scaled out; cos -> cosh where the root is imaginary."""
    ev = v / (2 * alpha)
    a, q = 2 * np.pi * ev / eps, 1 / eps - (ev / eps) ** 2
    r = 2 * np.pi * np.sqrt(np.abs(q))
    e = np.exp(-a)
    # sinh(a)/(cosh(a) - c), times e^-a above and below; cosh(a) - cos(r) = 2 (sinh^2(a/2) + sin^2(r/2))
    osc = (1 - e) ** 2 / 2 + 2 * e * np.sin(np.where(q >= 0, r, 0) / 2) ** 2
    hyp = (1 + e * e) / 2 - (np.exp(np.where(q < 0, r, 0) - a) + np.exp(-np.where(q < 0, r, 0) - a)) / 2
    return np.pi / ev * (1 - e * e) / 2 / np.where(q >= 0, osc, hyp)

def hulthen_average(x, alpha, eps, h=1 / 80):
    """<S> with v = 2w/sqrt(x), weight w^2 e^{-w^2}; double-exponential quadrature in w."""
    t = np.arange(-6, 3, h)
    w = np.exp(t - np.exp(-t)); dw = w * (1 + np.exp(-t)) * h
    return 4 / math.sqrt(math.pi) * float((w * w * np.exp(-w * w) * hulthen_factor(2 * w / math.sqrt(x), alpha, eps)) @ dw)

def loglog(points):
    """Interpolant of a table, straight lines in the logarithms, zero outside."""
    e, q = np.log(np.array(points, float)).T
    return lambda r: np.where((np.log(r) >= e[0] - 1e-15) & (np.log(r) <= e[-1] + 1e-15), np.exp(np.interp(np.log(r), e, q)), 0.0)

def table_average(x, m, points):
    """<sigma v> of sigma(sqrt s) given as a table (GeV, GeV^-2), by Gauss-Legendre in y = (sqrt(s) - 2m)/T between the rows."""
    T, f = m / x, loglog(points)
    lo, hi = max(0.0, (points[0][0] - 2 * m) / T), min(80.0, (points[-1][0] - 2 * m) / T)
    if hi <= lo: return 0.0
    cuts = sorted({lo, hi, *[c for c in ((r - 2 * m) / T for r, _ in points) if lo < c < hi], *[k for k in np.geomspace(1e-4, 80, 60) if lo < k < hi]})
    def g(y):
        r = 2 * m + y * T
        return f(r) * (y * T) * (r + 2 * m) * r * kve(1, r / T) * np.exp(-y) * 2 * r * T
    return _glq(g, cuts) / (8 * m**4 * T * float(kve(2, x)) ** 2)

def scattering_rate(T, sigma, incoming, mx, knots, scaled=False):
    """gamma(T) of section 7 (ED97) for sigma(sqrt s): Gauss-Legendre in y = (sqrt(s) - sqrt(s_min))/T, s_min = max(m1 + m2, m_X)^2;
    scaled: times exp(sqrt(s_min)/T)."""
    (m1, g1), (m2, g2) = [(q["massGeV"], q["degreesOfFreedom"]) for q in incoming]
    r0 = max(m1 + m2, mx)
    cuts = sorted({0.0, 90.0, *[c for c in ((r - r0) / T for r in knots) if 0 < c < 90], *[k for k in np.geomspace(1e-4, 90, 40)]})
    def f(y):
        r = r0 + y * T
        return sigma(r) * (r * r - (m1 + m2) ** 2) * (r * r - (m1 - m2) ** 2) * kve(1, r / T) * np.exp(-y) * 2 * T
    return g1 * g2 * T / (32 * math.pi**4) * _glq(f, cuts) * (1.0 if scaled else math.exp(-r0 / T))

class Rate:
    """sigma_v(x) for candidate["annihilation"]."""
    def __init__(s, cand, key="annihilation"):
        a, m = cand[key], cand["massGeV"]
        s.kind = a["kind"]
        u = C.CM3_PER_S
        s.species = None
        if s.kind == "partial-waves":
            A, B = a.get("sWaveCm3PerS", 0) * u, a.get("pWaveCm3PerS", 0) * u
            s.f = lambda x: A + 6 * B / x
        elif s.kind == "power-law":
            A, n = a["coefficientCm3PerS"] * u, a["exponent"]
            s.f = lambda x: A * x ** (-n)
        elif s.kind == "sommerfeld":
            A, al = a["sWaveCm3PerS"] * u, a["couplingAlpha"]
            if "mediatorMassGeV" in a:
                eps = math.pi**2 * a["mediatorMassGeV"] / (6 * al * m)
                s.f = s._cached(lambda x: A * hulthen_average(x, al, eps))
            else: s.f = lambda x: A * coulomb_average(x, al)
        elif s.kind == "cross-section":
            s.f = s._cached(lambda x: table_average(x, m, a["points"]))
        elif s.kind == "resonance":
            gs = cand["degreesOfFreedom"] / (1 if cand.get("selfConjugate", True) else 2)
            om = (2 * a["spin"] + 1) / gs**2
            pre = 16 * math.pi * om * a["branchingProduct"] * (2 if cand.get("selfConjugate", True) else 1)
            assert 0 < a["branchingProduct"] <= 0.25
            mr, gr = a["massGeV"], a["widthGeV"]
            s.f = s._cached(lambda x: resonance_average(x, m, mr, gr, pre))
        elif s.kind == "coannihilation":
            sp = s.species = [{"massGeV": m, "degreesOfFreedom": cand["degreesOfFreedom"], "statistics": cand["statistics"]}] + a["others"]
            mm = np.array([q["massGeV"] for q in sp]); g = np.array([q["degreesOfFreedom"] for q in sp])
            M1 = np.zeros((len(sp),) * 2); M2 = M1.copy()
            for p in a["pairs"]:
                i, j = p["first"], p["second"]
                M1[i, j] = M1[j, i] = p.get("sWaveCm3PerS", 0) * u
                M2[i, j] = M2[j, i] = p.get("pWaveCm3PerS", 0) * u
            exact = a.get("weights", "exact") == "exact"
            dl = mm / m - 1
            def f(x):
                if exact: w = g * (mm / m) ** 2 * kve(2, x * mm / m) * np.exp(-x * dl)
                else: w = g * (1 + dl) ** 1.5 * np.exp(-x * dl)
                w = w / w.sum()
                return float(w @ (M1 + 6 / x * M2) @ w)
            s.f = f
        else: raise ValueError(s.kind)
    def _cached(s, direct, top=1e6):
        """Interpolant in ln x up to 1e6, the integral itself beyond."""
        s.direct = direct
        c = Piecewise(lambda l: np.array([math.log(direct(math.exp(l)))]), math.log(1e-3), math.log(top), tol=1e-12)
        return lambda x: math.exp(c(math.log(x))[0]) if x < top else direct(x)
    def __call__(s, x): return s.f(x)
