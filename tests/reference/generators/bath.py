"""The Standard Model bath (the conventions, sections 3 and 4): g_rho, g_s, d ln g_s/d ln T for each treatment.

Every pressure-defined treatment is carried as a jet (f, f', f'') of f = p/T^4 with respect to ln T:
  s/T^3 = 4f + f',   rho/T^4 = 3f + f',   (ds/dln T)/T^3 = 12f + 7f' + f''.
"""
import math
import numpy as np
from scipy.optimize import brentq
from species import ideal, ETA

PI2 = math.pi**2
GL16 = np.polynomial.legendre.leggauss(16)

class Jet:
    """Value, first and second derivative with respect to ln T."""
    def __init__(s, v, a=0.0, b=0.0): s.v, s.a, s.b = v, a, b
    def __add__(s, o):
        o = _j(o); return Jet(s.v + o.v, s.a + o.a, s.b + o.b)
    __radd__ = __add__
    def __neg__(s): return Jet(-s.v, -s.a, -s.b)
    def __sub__(s, o): return s + (-_j(o))
    def __rsub__(s, o): return _j(o) + (-s)
    def __mul__(s, o):
        o = _j(o); return Jet(s.v * o.v, s.a * o.v + s.v * o.a, s.b * o.v + 2 * s.a * o.a + s.v * o.b)
    __rmul__ = __mul__
    def inv(s): return s.f(1 / s.v, -1 / s.v**2, 2 / s.v**3)
    def __truediv__(s, o): return s * _j(o).inv()
    def __rtruediv__(s, o): return _j(o) * s.inv()
    def f(s, v, d, dd): return Jet(v, d * s.a, dd * s.a**2 + d * s.b)
    def exp(s):
        e = math.exp(s.v); return s.f(e, e, e)
    def pow(s, k): return s.f(s.v**k, k * s.v**(k - 1), k * (k - 1) * s.v**(k - 2))
    def logistic(s):
        w = 1 / (1 + math.exp(-s.v)) if s.v > -700 else 0.0
        m = 1 / (1 + math.exp(s.v)) if s.v < 700 else 0.0
        return s.f(w, w * m, w * m * (m - w))

def _j(o): return o if isinstance(o, Jet) else Jet(o)

LEPTONS = [("e", 0.51099895e-3, 4, 1), ("mu", 0.1056583755, 4, 1), ("tau", 1.77693, 4, 1)]
QUARKS = [("u", 2.16e-3, 12, 1), ("d", 4.70e-3, 12, 1), ("s", 0.0935, 12, 1), ("c", 1.273, 12, 1), ("b", 4.183, 12, 1),
          ("t", 172.57, 12, 1)]
BOSONS = [("W", 80.3692, 6, -1), ("Z", 91.1880, 3, -1), ("H", 125.20, 1, -1)]
GLUON = [("g", 0.0, 16, -1)]
PHOTON = [("photon", 0.0, 2, -1)]
PIONS = [("pi+-", 0.13957039, 2, -1), ("pi0", 0.1349768, 1, -1)]
HADRONS = PIONS + [("K+-", 0.493677, 2, -1), ("K0", 0.497611, 2, -1), ("eta", 0.547862, 1, -1), ("rho", 0.77526, 9, -1),
    ("omega", 0.78266, 3, -1), ("K*", 0.89167, 12, -1), ("p", 0.93827209, 4, 1), ("n", 0.93956542, 4, 1),
    ("eta'", 0.95778, 1, -1), ("phi", 1.019461, 3, -1)]

# Heavier states to 2.05 GeV (PDG listings, from memory): name, mass, g with charge states and antiparticles, statistics.
HEAVIER = [(n, m, g, -1) for n, m, g in (("a0(980)", 0.980, 3), ("f0(980)", 0.990, 1), ("h1(1170)", 1.166, 3), ("b1(1235)", 1.2295, 9),
    ("a1(1260)", 1.230, 9), ("K1(1270)", 1.253, 12), ("f2(1270)", 1.2754, 5), ("f1(1285)", 1.2818, 3), ("eta(1295)", 1.294, 1),
    ("pi(1300)", 1.300, 3), ("a2(1320)", 1.3182, 15), ("f0(1370)", 1.350, 1), ("K1(1400)", 1.403, 12), ("K*(1410)", 1.414, 12),
    ("eta(1405)", 1.409, 1), ("omega(1420)", 1.410, 3), ("f1(1420)", 1.4263, 3), ("K0*(1430)", 1.425, 4), ("K2*(1430)", 1.4273, 20),
    ("rho(1450)", 1.465, 9), ("a0(1450)", 1.474, 3), ("eta(1475)", 1.475, 1), ("f0(1500)", 1.506, 1), ("f2'(1525)", 1.5174, 5),
    ("eta2(1645)", 1.617, 5), ("pi1(1600)", 1.661, 9), ("omega3(1670)", 1.667, 7), ("omega(1650)", 1.670, 3), ("pi2(1670)", 1.6706, 15),
    ("phi(1680)", 1.680, 3), ("rho3(1690)", 1.6888, 21), ("K*(1680)", 1.718, 12), ("rho(1700)", 1.720, 9), ("f0(1710)", 1.733, 1),
    ("K2(1770)", 1.773, 20), ("K3*(1780)", 1.779, 28), ("pi(1800)", 1.810, 3), ("K2(1820)", 1.819, 20), ("phi3(1850)", 1.854, 7),
    ("f2(1950)", 1.936, 5), ("a4(1970)", 1.967, 27), ("f2(2010)", 2.011, 5), ("f4(2050)", 2.018, 9), ("K4*(2045)", 2.048, 36))] + [
    (n, m, g, 1) for n, m, g in (("Lambda", 1.115683, 4), ("Sigma+", 1.18937, 4), ("Sigma0", 1.192642, 4), ("Sigma-", 1.197449, 4),
    ("Delta(1232)", 1.232, 32), ("Xi0", 1.31486, 4), ("Xi-", 1.32171, 4), ("Sigma(1385)", 1.3846, 24), ("Lambda(1405)", 1.4051, 4),
    ("N(1440)", 1.440, 8), ("N(1520)", 1.515, 16), ("Lambda(1520)", 1.519, 8), ("N(1535)", 1.530, 8), ("Xi(1530)", 1.5334, 16),
    ("Delta(1600)", 1.570, 32), ("Lambda(1600)", 1.600, 4), ("Delta(1620)", 1.610, 16), ("N(1650)", 1.650, 8), ("Sigma(1660)", 1.660, 12),
    ("Omega", 1.67245, 8), ("Lambda(1670)", 1.674, 4), ("N(1675)", 1.675, 24), ("Sigma(1670)", 1.675, 24), ("N(1680)", 1.685, 24),
    ("Lambda(1690)", 1.690, 8), ("Xi(1690)", 1.690, 8), ("N(1710)", 1.710, 8), ("Delta(1700)", 1.710, 32), ("N(1700)", 1.720, 16),
    ("N(1720)", 1.720, 16), ("Sigma(1750)", 1.750, 12), ("Sigma(1775)", 1.775, 36), ("Xi(1820)", 1.823, 16))]
EXTENDED = HADRONS + HEAVIER

def gas(T, species):
    """Jet of p/T^4 for a list of (name, mass, g, eta)."""
    out = np.zeros(3)
    for eta in (1, -1, 0):
        sel = [(m, g) for _, m, g, e in species if e == eta]
        if not sel: continue
        m, g = np.array(sel).T
        x = m / T
        _, p, i1, i0 = ideal(x, eta)
        # dp/dT at fixed mass: T ds/dT pieces of species.py, turned into derivatives of f = p/T^4
        s = 4 * p + x**2 * i1
        d = 3 * s + 2 * x**2 * i1 + x**4 * i0
        f1 = s - 4 * p
        out += [(g * p).sum(), (g * f1).sum(), (g * (d - 12 * p - 7 * f1)).sum()]
    return Jet(*out)

def hq14(T):
    """Lattice pressure of u, d, s and gluons (HQ14)."""
    t = Jet(T / 0.154, T / 0.154, T / 0.154)
    u = t.inv()
    u2 = u * u; u4 = u2 * u2
    pid = 95 * PI2 / 180
    frac = (pid - 8.7704 * u + 3.9200 * u2 + 0.3419 * u4) / (1 - 1.2600 * u + 0.8425 * u2 - 0.0475 * u4)
    return (2 * 3.8706 * (t - 0.9761)).logistic() * frac          # 1/2 (1 + tanh y) = logistic(2y)

def smootherstep(T, lo, hi):
    if T <= lo: return Jet(0.0)
    if T >= hi: return Jet(1.0)
    k = 1 / (hi - lo)
    z = Jet((T - lo) * k, T * k, T * k)
    return z * z * z * (10 - 15 * z + 6 * z * z)

# ---- tabulated and fitted whole baths -------------------------------------------------------------------------------
B16 = np.array([[0.00, 10.71, 1.00228], [0.50, 10.74, 1.00029], [1.00, 10.76, 1.00048], [1.25, 11.09, 1.00505],
    [1.60, 13.68, 1.02159], [2.00, 17.61, 1.02324], [2.15, 24.07, 1.05423], [2.20, 29.84, 1.07578], [2.40, 47.83, 1.06118],
    [2.50, 53.04, 1.04690], [3.00, 73.48, 1.01778], [4.00, 83.10, 1.00123], [4.30, 85.56, 1.00389], [4.60, 91.97, 1.00887],
    [5.00, 102.17, 1.00750], [5.45, 104.98, 1.00023]])

def b16_splines(end="natural"):
    from scipy.interpolate import CubicSpline
    return CubicSpline(B16[:, 0], B16[:, 1], bc_type=end), CubicSpline(B16[:, 0], B16[:, 2], bc_type=end)

A = [1, 1.11724, 3.12672e-1, -4.68049e-2, -2.65004e-2, -1.19760e-3, 1.82812e-4, 1.36436e-4, 8.55051e-5, 1.22840e-5, 3.82259e-7, -6.87035e-9]
B = [1.43382e-2, 1.37559e-2, 2.92108e-3, -5.38533e-4, -1.62496e-4, -2.87906e-5, -3.84278e-6, 2.78776e-6, 7.40342e-7, 1.17210e-7, 3.72499e-9, -6.74107e-11]
CC = [1, 6.07869e-1, -1.54485e-1, -2.24034e-1, -2.82147e-2, 2.90620e-2, 6.86778e-3, -1.00005e-3, -1.69104e-4, 1.06301e-5, 1.69528e-6, -9.33311e-8]
DD = [7.07388e1, 9.18011e1, 3.31892e1, -1.39779, -1.52558, -1.97857e-2, -1.60146e-1, 8.22615e-5, 2.02651e-2, -1.82134e-5, 7.83943e-5, 7.13518e-5]

def _poly(c, t):
    v = d = 0.0
    for k in reversed(c):
        d = d * t + v; v = v * t + k
    return v, d

def _fit_exp(x, a, c1, c2, c3):
    """e^{-a x}(1 + c1 x + c2 x^2 + c3 x^3) and d/dln T of it (dx/dln T = -x)."""
    if x > 700: return 0.0, 0.0
    e = math.exp(-a * x)
    q = 1 + c1 * x + c2 * x * x + c3 * x**3
    return e * q, -x * e * (c1 + 2 * c2 * x + 3 * c3 * x * x - a * q)

F_RHO = (1.04855, 1.03757, 0.508630, 0.0893988); B_RHO = (1.03149, 1.03317, 0.398264, 0.0648056)
F_S = (1.04190, 1.03400, 0.456426, 0.0595248); B_S = (1.03365, 1.03397, 0.342548, 0.0506182)
S_SS = (1.0419, 1.034, 0.456426, 0.0595249)
MASSES = dict(e=511e-6, mu=0.1056, p0=0.135, pc=0.140, m1=0.5, m2=0.77, m3=1.2, m4=2.0)

def fit2018(T):
    """(g_rho, g_s, d ln g_s/d ln T) of the SS18 fit."""
    if T >= 0.120:
        t = math.log(T)
        a, a1 = _poly(A, t); b, b1 = _poly(B, t); c, c1 = _poly(CC, t); d, d1 = _poly(DD, t)
        r = 1 + c / d
        g = a / b
        return g, g / r, a1 / a - b1 / b - (c1 / d - c * d1 / d**2) / r
    m = MASSES
    S0, S1 = _fit_exp(m["e"] / T, *S_SS)
    S0, S1 = 1 + 1.75 * S0, 1.75 * S1
    gr = 2.030 + 1.353 * S0 ** (4 / 3) + 3.495 * _fit_exp(m["e"] / T, *F_RHO)[0] + 3.446 * _fit_exp(m["mu"] / T, *F_RHO)[0]
    for k, w in (("p0", 1.05), ("pc", 2.08), ("m1", 4.165), ("m2", 30.55), ("m3", 89.4), ("m4", 8209)):
        gr += w * _fit_exp(m[k] / T, *B_RHO)[0]
    gs, gs1 = 2.008 + 1.923 * S0, 1.923 * S1
    for k, w, c in (("e", 3.442, F_S), ("mu", 3.468, F_S), ("p0", 1.034, B_S), ("pc", 2.068, B_S), ("m1", 4.16, B_S),
                    ("m2", 30.55, B_S), ("m3", 90, B_S), ("m4", 6209, B_S)):
        v, d = _fit_exp(m[k] / T, *c)
        gs += w * v; gs1 += w * d
    return gr, gs, gs1 / gs

# ---- the bath as a whole --------------------------------------------------------------------------------------------
DEFAULT_NU = {"treatment": "specified", "nEff": 3.044, "decouplingTemperatureGeV": 0.002, "entropyScaling": "heated"}
T_JOIN = 10 ** -2.5                                                    # 10^0.5 MeV: below it the exact photon, e, nu content
WHOLE = ("lattice-2016", "fit-2018")

class Bath:
    """history["bath"], history["neutrinos"], history["extraSpecies"] -> g_rho, g_s, d ln g_s/d ln T at one T."""
    def __init__(self, history, spline_end="natural"):
        b = history["bath"]
        self.kind = b["treatment"]
        self.tc = b.get("transitionTemperatureGeV", 0.1565)
        self.dt = b.get("transitionWidthGeV", 0.02)
        self.hadrons = {"short": HADRONS, "long": EXTENDED}[b.get("hadrons", "long" if self.kind == "lattice-2014" else "short")]
        self.band = b.get("band", 0) if self.kind == "fit-2018" else 0
        nu = {**DEFAULT_NU, **history.get("neutrinos", {})}
        self.nu, self.tdec, self.linear = nu["treatment"], nu["decouplingTemperatureGeV"], nu["entropyScaling"] == "linear"
        self.neff = nu["nEff"] if self.nu == "specified" else 3
        self.extra = history.get("extraSpecies", [])
        self.bath_extra = [(e["name"], e["massGeV"], e["degreesOfFreedom"], ETA[e["statistics"]]) for e in self.extra
                           if e["coupling"]["kind"] == "bath"]
        self.own_nu = self.kind not in WHOLE
        if self.kind == "lattice-2016" or self.band:
            self.sg, self.sr = b16_splines(spline_end)
            self.t_hi = 10 ** (B16[-1, 0] - 3)
            i = self._stats(gas(self.t_hi, PHOTON + LEPTONS + QUARKS + GLUON + BOSONS))
            self.k_hi = (B16[-1, 1] / (i[0] + 5.25), B16[-1, 1] / B16[-1, 2] / (i[1] + 5.25))
        self.g_dec = self._plasma(self.tdec)[1]

    def breaks(self):
        """Temperatures where the bath jumps or has a kink."""
        out = [] if self.kind == "fit-2018" else [self.tdec]
        if self.band: out += [T_JOIN / 10, *10 ** (B16[1:, 0] - 3), self.t_hi * 10]
        if self.kind == "thresholds":
            out += [m for _, m, _, _ in LEPTONS + BOSONS] + [m for _, m, _, _ in QUARKS if m > self.tc]
            out += [m for _, m, _, _ in PIONS if m < self.tc] + [self.tc]
            out += [m for _, m, _, _ in self.bath_extra]
        if self.kind == "ideal-switch": out += [self.tc]
        if self.kind == "lattice-2014": out += [0.130, 0.145]
        if self.kind == "lattice-2016": out += list(10 ** (B16[1:, 0] - 3))
        if self.kind == "fit-2018": out += [0.120]
        return sorted(out)

    @staticmethod
    def _stats(j):
        """g_rho, g_s, dg_s/dln T from a pressure jet."""
        c = 45 / (2 * PI2)
        s = 4 * j.v + j.a
        return 30 / PI2 * (3 * j.v + j.a), c * s, c * (12 * j.v + 7 * j.a + j.b - 3 * s)

    def _plasma(self, T):
        """(g_rho, g_s, dg_s/dln T) of everything that shares the photon temperature, neutrinos left out; for the two
        whole-bath treatments this is used below 10^0.5 MeV (lattice-2016) only."""
        if self.kind != "thresholds": return self._stats(self._jet(T))
        w = lambda sp: sum(g * (7 / 8 if e == 1 else 1.0) for _, m, g, e in sp if T > m)
        g = w(PHOTON + LEPTONS + BOSONS + self.bath_extra) + (w(QUARKS + GLUON) if T > self.tc else w(PIONS))
        return g, g, 0.0

    def _jet(self, T):
        """Pressure jet of the same."""
        k, x = self.kind, self.bath_extra
        rest = PHOTON + LEPTONS + BOSONS
        free, had = QUARKS + GLUON, self.hadrons
        if k == "ideal-switch": j = gas(T, rest + (free if T > self.tc else had) + x)
        elif k == "crossover": j = gas(T, rest + x) + self._blend(T)
        elif k == "lattice-2014":
            w = smootherstep(T, 0.130, 0.145)
            j = gas(T, rest + x)
            if w.v < 1: j = j + (1 - w) * gas(T, had)
            if w.v > 0: j = j + w * (hq14(T) + gas(T, QUARKS[3:]))
        else: j = gas(T, PHOTON + LEPTONS[:1] + x)
        return j

    @staticmethod
    def _gl(parts, a, b):
        """Int s T dln T between two logarithms of T."""
        return (b - a) / 2 * sum(wt * parts((a + b) / 2 + (b - a) / 2 * z)[0] * math.exp(4 * ((a + b) / 2 + (b - a) / 2 * z)) for z, wt in zip(*GL16))

    def _blend(self, T):
        """crossover: jet of p/T^4 of the strongly interacting part from s = (1 - w) s_hadrons + w s_free, p = Int_0^T s dT',
        w = 1/2 [1 + tanh(ln(T/T_c)/delta)], delta = width/T_c.  ds/dln T is analytic, p by Gauss-Legendre in ln T."""
        delta = self.dt / self.tc
        def parts(L):
            z = 2 * (L - math.log(self.tc)) / delta
            w = 1 / (1 + math.exp(-z)) if z > -700 else 0.0
            m = 1 / (1 + math.exp(z)) if z < 700 else 0.0
            T = math.exp(L)
            a, b = gas(T, self.hadrons), gas(T, QUARKS + GLUON)
            sa, sb = 4 * a.v + a.a, 4 * b.v + b.a                            # s/T^3
            da, db = 12 * a.v + 7 * a.a + a.b, 12 * b.v + 7 * b.a + b.b      # ds/dln T / T^3
            return m * sa + w * sb, m * da + w * db + (2 / delta) * w * m * (sb - sa), a.v
        L, Lc = math.log(T), math.log(self.tc)
        La, Lb = Lc - 21 * delta, Lc + 21 * delta                            # w = e^-42 and 1 - e^-42
        s, d, ph = parts(L)
        if L <= La: f = ph
        else:
            if not hasattr(self, "_cum"):                                    # p at the edges of the segments, once
                self._cum = [parts(La)[2] * math.exp(4 * La)]
                for i in range(120): self._cum.append(self._cum[-1] + self._gl(parts, La + (Lb - La) * i / 120, La + (Lb - La) * (i + 1) / 120))
                self._bag = self._cum[-1] - gas(math.exp(Lb), QUARKS + GLUON).v * math.exp(4 * Lb)
            if L >= Lb: f = gas(T, QUARKS + GLUON).v + self._bag * math.exp(-4 * L)
            else:
                i = int((L - La) / (Lb - La) * 120)
                f = (self._cum[i] + self._gl(parts, La + (Lb - La) * i / 120, L)) * math.exp(-4 * L)
        f1 = s - 4 * f
        return Jet(f, f1, d - 12 * f - 7 * f1)

    def _neutrinos(self, T, gs, d):
        """(factor on rho, factor on s, d of it/dln T, T_nu/T) from the plasma's g_s and dg_s/dln T, below T_dec."""
        r = (gs / self.g_dec) ** (1 / 3)
        if self.nu != "specified" or not self.own_nu: return 1.0, 1.0, 0.0, r
        rinf = (2 / self.g_dec) ** (1 / 3)
        h = (1 / r - 1) / (1 / rinf - 1)
        dh = -(d / gs / 3) / r / (1 / rinf - 1)
        z = (4 / 11) ** (1 / 3) / rinf
        KR, KS = self.neff / 3 * z**4, (self.neff / 3) ** (1 if self.linear else 0.75) * z**3
        return 1 + (KR - 1) * h, 1 + (KS - 1) * h, (KS - 1) * dh, r

    def _with_neutrinos(self, T):
        gr, gs, d = self._plasma(T)
        if T >= self.tdec: return gr + 5.25, gs + 5.25, d
        kr, ks, dks, r = self._neutrinos(T, gs, d)
        return gr + 5.25 * kr * r**4, gs + 5.25 * ks * r**3, d + 5.25 * r**3 * (dks + ks * d / gs)

    def _b16(self, T):
        """(g_rho, g_s, dg_s/dln T) of the table, inside it."""
        L = math.log10(T) + 3
        g, g1 = float(self.sg(L)), float(self.sg(L, 1)) / math.log(10)
        r, r1 = float(self.sr(L)), float(self.sr(L, 1)) / math.log(10)
        return g, g / r, g1 / r - g * r1 / r**2

    def _banded(self, T):
        """fit-2018 with its band.  Beyond the table the relative difference keeps its value at the end, times
        1 - (10 z^3 - 15 z^4 + 6 z^5) with z = |log10(T/T_end)|, and vanishes for z >= 1."""
        g, s, d = fit2018(T)
        if not self.band: return g, s, d * s
        end = min(max(T, T_JOIN), self.t_hi)
        z = abs(math.log10(T / end))
        if z >= 1: return g, s, d * s
        B, F = self._b16(end), fit2018(end)
        fade = 1 - z**3 * (10 - 15 * z + 6 * z * z)
        dfade = -30 * z * z * (1 - z) ** 2 / math.log(10) * (1 if T > end else -1)
        q = B[1] / F[1]
        dq = q * (B[2] / B[1] - F[2]) if T == end else 0.0
        ks = 1 + self.band * (q - 1) * fade
        return (g * (1 + self.band * (B[0] / F[0] - 1) * fade), s * ks,
                d * s * ks + s * self.band * (dq * fade + (q - 1) * dfade))

    def _standard(self, T):
        if self.kind == "fit-2018": return self._banded(T)
        if self.kind == "lattice-2016" and T >= T_JOIN:
            if T <= self.t_hi: return self._b16(T)
            i = self._stats(gas(T, PHOTON + LEPTONS + QUARKS + GLUON + BOSONS))
            fade = 1 + (self.k_hi[0] / self.k_hi[1] - 1) * (self.t_hi / T) ** 2   # g_rho/g_s -> that of the ideal gas
            return self.k_hi[1] * fade * (i[0] + 5.25), self.k_hi[1] * (i[1] + 5.25), self.k_hi[1] * i[2]
        return self._with_neutrinos(T)

    def __call__(self, T):
        """(g_rho, g_s, d ln g_s/d ln T) of the bath with the species coupled to it."""
        g, s, d = self._standard(T)
        if self.bath_extra and (self.kind == "fit-2018" or self.kind == "lattice-2016" and T >= T_JOIN):
            i = self._stats(gas(T, self.bath_extra))
            g, s, d = g + i[0], s + i[1], d + i[2]
        return g, s, d / s

    def g_p(self, T):
        """Pressure in pi^2 T^4/90; None where the specification leaves it open (fit-2018 below 10^0.5 MeV)."""
        if self.kind in WHOLE and T >= T_JOIN:
            g, s, _ = self(T)
            return 4 * s - 3 * g
        if self.kind == "fit-2018": return None
        gr, gs, d = self._plasma(T)
        gp = gr if self.kind == "thresholds" else 90 / PI2 * self._jet(T).v
        kr, _, _, r = (1, 1, 0, 1) if T >= self.tdec else self._neutrinos(T, gs, d)
        return gp + 5.25 * kr * r**4

    def apart(self, T, gs):
        """Species apart in entropy (`decoupled`, `ratio`): their g_rho and g_p (in units of the bath's T) and each T_X."""
        rho, p, temps = 0.0, 0.0, []
        for e in self.extra:
            kind = e["coupling"]["kind"]
            if kind == "bath": continue
            sp = [("", e["massGeV"], e["degreesOfFreedom"], ETA[e["statistics"]])]
            tx = T * e["coupling"]["ratio"] if kind == "ratio" else self._decoupled_temperature(T, gs, e["coupling"]["temperatureGeV"], sp)
            j = gas(tx, sp)
            rho += self._stats(j)[0] * (tx / T) ** 4
            p += 90 / PI2 * j.v * (tx / T) ** 4
            temps.append(tx)
        return rho, p, temps

    def _decoupled_temperature(self, T, gs, td, sp):
        """T_X: g_s,X a^3 T_X^3 and g_s,bath a^3 T^3 conserved apart from T_d down; T above."""
        if T >= td: return T
        st = lambda t: self._stats(gas(t, sp))[1]
        gd = self(td)[1]
        tx = T * (gs / gd) ** (1 / 3)
        if sp[0][1] == 0: return tx
        want = math.log(st(td) * gs / gd * T**3)
        F = lambda l: math.log(max(st(math.exp(l)), 1e-300)) + 3 * l - want
        return math.exp(brentq(F, math.log(tx) - 1e-9, math.log(td) + 1e-9, xtol=1e-14, rtol=1e-14))

    def g_s_today(self):
        return 2 + 7 / 11 * self.neff if self.linear else 2 + 21 / 11 * (self.neff / 3) ** 0.75

    def g_rho_today(self):
        return 2 * (1 + 7 / 8 * (4 / 11) ** (4 / 3) * self.neff)
