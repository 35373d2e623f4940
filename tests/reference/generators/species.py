"""One species in equilibrium (the conventions, section 2).

ideal(x, eta): double precision, vectorised in x, by a double-exponential quadrature u = exp(t - exp(-t)).
mp_species(x, eta): the same by mpmath's adaptive quadrature at 30 digits (slow, the reference of references).
All integrals are for g = 1 and T = 1.  Pieces:
  n  = 1/(2 pi^2) Int u^2 f          p  = 1/(6 pi^2) Int u^4/E f
  I1 = 1/(2 pi^2) Int u^2/E f        I0 = 1/(2 pi^2) Int f/E          f = 1/(e^E + eta)
  rho = 3p + x^2 I1,  s = rho + p,  ds/dln T = 3s + 2 x^2 I1 + x^4 I0   (integration by parts)
"""
import numpy as np
import mpmath as mp

_h = 1 / 24
_t = np.arange(-101, 169) * _h
_u = np.exp(_t - np.exp(-_t))
_w = _u * (1 + np.exp(-_t)) * _h

def ideal(x, eta):
    """(n, p, I1, I0) for each x; eta = +1 fermion, -1 boson, 0 Maxwell-Boltzmann."""
    x = np.atleast_1d(np.asarray(x, float))[:, None]
    e = np.sqrt(_u**2 + x**2)
    with np.errstate(over="ignore", under="ignore"):
        f = np.exp(-e) / (-np.expm1(-e) if eta == -1 else 1 + eta * np.exp(-e))
    c = 1 / (2 * np.pi**2)
    fe = f / e
    n = c * (f * _u**2) @ _w
    p = c / 3 * (fe * _u**4) @ _w
    i1 = c * (fe * _u**2) @ _w
    i0 = c * fe @ _w
    return n, p, i1, i0

ETA = {"fermion": 1, "boson": -1, "maxwell-boltzmann": 0}

def mp_species(x, eta, dps=30):
    with mp.workdps(dps):
        x = mp.mpf(x)
        E = lambda u: mp.sqrt(u * u + x * x)
        # scaled by e^x: mpmath's stopping rule is absolute
        f = lambda u: mp.exp(x - E(u)) / (1 + eta * mp.exp(-E(u)) if eta >= 0 else -mp.expm1(-E(u)))
        w = mp.sqrt(x) if x > 1 else mp.mpf(1)
        cuts = [0] + ([x / 4, x, 3 * x] if 0 < x < 0.3 else []) + [w * k for k in (0.75, 1.5, 3, 5, 8, 12, 20, 40, 90)]
        cuts = sorted(set(cuts))
        q = lambda g: mp.exp(-x) * mp.quad(g, cuts)
        n = q(lambda u: u * u * f(u) if u else mp.mpf(0)) / (2 * mp.pi**2)
        rho = q(lambda u: u * u * E(u) * f(u) if u else mp.mpf(0)) / (2 * mp.pi**2)
        p = q(lambda u: u**4 / E(u) * f(u) if u else mp.mpf(0)) / (6 * mp.pi**2)
        s = rho + p
        return {"n": n, "rho": rho, "p": p, "s": s,
                "gN": n / (mp.zeta(3) / mp.pi**2), "gRho": rho / (mp.pi**2 / 30), "gP": p / (mp.pi**2 / 90),
                "gS": s / (2 * mp.pi**2 / 45)}

def mp_species_sum(x, eta, dps=30):
    """The Bessel sum (x > 0): second method, used for the check only."""
    with mp.workdps(dps):
        x = mp.mpf(x)
        sgn = lambda k: (-eta) ** (k + 1)
        n = mp.mpf(0); p = mp.mpf(0); r = mp.mpf(0)
        for k in range(1, 4000):
            a = sgn(k)
            k1, k2 = mp.besselk(1, k * x), mp.besselk(2, k * x)
            dn, dp = a * x**2 * k2 / k, a * x**2 * k2 / k**2
            n += dn; p += dp; r += 3 * dp + a * x**3 * k1 / k
            if abs(dn) < mp.mpf(10) ** (-dps) * abs(n): break
        c = 1 / (2 * mp.pi**2)
        return {"n": c * n, "p": c * p, "rho": c * r}
