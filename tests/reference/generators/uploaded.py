"""Writes uploaded.json, baths of uploaded tables:  python3 uploaded.py

The rows are joined by scipy's not-a-knot CubicSpline in ln T, its slopes limited and handed to scipy's CubicHermiteSpline; a missing
column is integrated from dp = s dT, or from d(p/T) = (rho/T^2) dT, by QUADPACK row by row. Ideal gases below and above come from bath.py."""
import math
import numpy as np
from scipy.integrate import quad
from scipy.interpolate import CubicHermiteSpline, CubicSpline
from bath import Bath
from generate import BATHS, NU, save

INSTANT = NU["instantaneous"]

def limited(x, y):
    """Slopes of the not-a-knot spline, limited: at most three times the flatter chord beside a row and none at an extreme; where five
    rows bend the same way, up to one and a half times the least slope of the parabolas through three of them at the middle one."""
    d = CubicSpline(x, y, bc_type="not-a-knot")(x, 1)
    c = np.diff(y) / np.diff(x)
    for i in range(len(x)):
        l, r = c[max(i - 1, 0)], c[min(i, len(c) - 1)]
        most = 3 * min(abs(l), abs(r)) if l * r > 0 else 0.0
        sign = math.copysign(1, l)
        if 2 <= i <= len(x) - 3:
            bends = np.sign(np.diff(c[i - 2:i + 2]))
            if abs(bends.sum()) == 3:
                ps = [np.polynomial.Polynomial.fit(x[k:k + 3] - x[i], y[k:k + 3], 2).deriv()(0.0) for k in (i - 2, i - 1, i)]
                if abs(np.sign(ps).sum()) == 3 and 1.5 * min(np.abs(ps)) > most: most, sign = 1.5 * min(np.abs(ps)), np.sign(ps[0])
        d[i] = sign * min(max(sign * d[i], 0), most)
    return CubicHermiteSpline(x, y, d)

class Uploaded:
    def __init__(self, points):
        self.T = np.array([p["temperatureGeV"] for p in points]); x = np.log(self.T)
        self.ideal = Bath({"bath": BATHS["ideal-switch"], "neutrinos": INSTANT})
        self.gs = limited(x, np.array([p["gS"] for p in points])) if "gS" in points[0] else None
        self.gr = limited(x, np.array([p["gRho"] for p in points])) if "gRho" in points[0] else None
        g, s, _ = self.ideal(self.T[0]); gp = 4 * s - 3 * g
        # p/T^4 in units of pi^2/90 at every row
        if self.gr is None:
            self.p = [gp / s * float(self.gs(x[0]))]
            step = lambda a, b, p: (p * a**4 + quad(lambda T: 4 * self.gs(math.log(T)) * T**3, a, b, epsrel=1e-13, epsabs=0)[0]) / b**4
        elif self.gs is None:
            self.p = [gp / g * float(self.gr(x[0]))]
            step = lambda a, b, p: (p * a**3 + quad(lambda T: 3 * self.gr(math.log(T)) * T**2, a, b, epsrel=1e-13, epsabs=0)[0]) / b**3
        if self.gr is None or self.gs is None:
            self.step = step
            for a, b in zip(self.T, self.T[1:]): self.p.append(step(a, b, self.p[-1]))
    def inside(self, T):
        L = math.log(T)
        if self.gr is not None and self.gs is not None:
            return float(self.gr(L)), float(self.gs(L)), float(self.gs(L, 1) / self.gs(L))
        i = min(max(int(np.searchsorted(self.T, T, "right")) - 1, 0), len(self.T) - 2)
        gp = self.step(self.T[i], T, self.p[i]) if T > self.T[i] else self.p[i]
        if self.gr is None:
            s = float(self.gs(L)); return (4 * s - gp) / 3, s, float(self.gs(L, 1)) / s
        g = float(self.gr(L)); s = (3 * g + gp) / 4
        return g, s, (3 * float(self.gr(L, 1)) + 3 * (g - gp)) / 4 / s
    def __call__(self, T):
        if T < self.T[0]: return self.ideal(T)
        if T <= self.T[-1]: return self.inside(T)
        (gl, sl, _), (g0, s0, _), (g, s, d) = self.inside(self.T[-1]), self.ideal(self.T[-1]), self.ideal(T)
        j = sl / s0
        return j * g + (gl - j * g0) * (self.T[-1] / T) ** 4, j * s, d

def sampled(treatment, temperatures, columns, digits):
    b = Bath({"bath": BATHS[treatment], "neutrinos": INSTANT}); out = []
    for T in temperatures:
        g, s, _ = b(T); values = {"gRho": g, "gS": s}
        out.append({"temperatureGeV": T, **{c: float("%.*g" % (digits, values[c])) for c in columns}})
    return out

def uploaded():
    rng = np.random.default_rng(3)
    uneven = [float("%.6g" % T) for T in np.exp(np.sort(np.concatenate([[math.log(0.004), math.log(2000)], rng.uniform(math.log(0.0041), math.log(1990), 58)])))]
    from bath import B16
    b16 = [{"temperatureGeV": float("%.6g" % 10 ** (l - 3)), "gRho": g, "gS": float("%.6g" % (g / r))} for l, g, r in B16]
    tables = [("the table of Borsanyi et al. 2016, both columns", b16),
              ("crossover, g_s alone, 60 even rows", sampled("crossover", [float(t) for t in np.geomspace(0.004, 1e3, 60)], ["gS"], 12)),
              ("crossover, g_rho alone, 60 even rows", sampled("crossover", [float(t) for t in np.geomspace(0.004, 1e3, 60)], ["gRho"], 12)),
              ("crossover, g_s alone, uneven rows of four digits", sampled("crossover", uneven, ["gS"], 4)),
              ("2014 lattice, both columns, uneven rows of five digits", sampled("lattice-2014", uneven, ["gRho", "gS"], 5))]
    blocks = []
    for name, points in tables:
        b = Uploaded(points); rows = []
        ts = [1e-5, 3e-4, 9e-4] + [float(t) for t in np.geomspace(points[0]["temperatureGeV"] * 1.01, points[-1]["temperatureGeV"] * 0.99, 60)] + [points[-1]["temperatureGeV"] * f for f in (1.1, 3, 1e4)]
        for T in ts:
            g, s, d = b(T); rows.append({"temperatureGeV": T, "gRho": g, "gS": s, "dLnGsDLnT": d})
        blocks.append({"name": name, "bath": {"treatment": "uploaded", "points": points}, "neutrinos": INSTANT, "rows": rows})
    save("uploaded.json", {"what": "baths of uploaded tables: rows joined by limited cubic splines in ln T, a missing column from dp = s dT, ideal gases outside the rows",
        "precision": "1e-12; integrals 1e-11", "blocks": blocks})

if __name__ == "__main__": uploaded()
