"""Writes the JSON files of the folder above:  python3 generate.py [species bath history rates abundance attribution inverse published merge]"""
import itertools, json, math, sys, os, time
from multiprocessing import Pool
import numpy as np, scipy, mpmath as mp
from scipy.special import kve
import constants as C
import species as SP
from bath import Bath
from history import History, EarlyMatter, MatterFromVacuum
import rates as RT
import relic as R

HERE = os.path.dirname(os.path.dirname(os.path.abspath(__file__)))  # the folder of the JSON files, above this one
VERSIONS = {"python": sys.version.split()[0], "numpy": np.__version__, "scipy": scipy.__version__, "mpmath": mp.__version__}
NU = {"specified": {"treatment": "specified", "nEff": 3.044, "decouplingTemperatureGeV": 0.002, "entropyScaling": "heated"},
      "instantaneous": {"treatment": "instantaneous", "decouplingTemperatureGeV": 0.002}}
NU["linear"] = {**NU["specified"], "entropyScaling": "linear"}
TODAY = {"temperatureK": 2.7255, "hubbleParameter": 0.674, "omegaMatterH2": 0.143}
BATHS = {"thresholds": {"treatment": "thresholds", "transitionTemperatureGeV": 0.1565},
         "ideal-switch": {"treatment": "ideal-switch", "transitionTemperatureGeV": 0.1565},
         "crossover": {"treatment": "crossover", "transitionTemperatureGeV": 0.1565, "transitionWidthGeV": 0.02},
         "lattice-2014": {"treatment": "lattice-2014"}, "lattice-2016": {"treatment": "lattice-2016"},
         "fit-2018": {"treatment": "fit-2018", "band": 0}}

def save(name, data, folder=HERE):
    data = {"madeWith": VERSIONS, **data}
    with open(os.path.join(folder, name), "w") as f: json.dump(data, f, indent=1, allow_nan=False); f.write("\n")
    print("wrote", name, flush=True)

def hist(bath="fit-2018", nu="specified", expansion=None, extra=None, tmax=None, **bathpar):
    return {"bath": {**BATHS[bath], **bathpar}, "neutrinos": NU[nu], "extraSpecies": extra or [],
            "expansion": expansion or {"kind": "radiation"}, "maximumTemperatureGeV": tmax, "today": TODAY}

def dec(name, g, st, m, td): return {"name": name, "degreesOfFreedom": g, "statistics": st, "massGeV": m, "coupling": {"kind": "decoupled", "temperatureGeV": td}}
def bathsp(name, g, st, m): return {"name": name, "degreesOfFreedom": g, "statistics": st, "massGeV": m, "coupling": {"kind": "bath"}}
def ratio(name, g, st, m, r): return {"name": name, "degreesOfFreedom": g, "statistics": st, "massGeV": m, "coupling": {"kind": "ratio", "ratio": r}}
def FL(n, t): return {"kind": "fluid", "index": n, "equalityTemperatureGeV": t}
def EM(trh, **k): return {"kind": "early-matter", "reheatTemperatureGeV": trh, **k}

# ---- species --------------------------------------------------------------------------------------------------------
XS = [0, 1e-4, 1e-3, 0.01, 0.03, 0.1, 0.2, 0.3, 0.5, 0.75, 1, 1.5, 2, 3, 4, 5, 7, 10, 15, 20, 30, 40, 50, 70, 100]
KS = [1e-6, 1e-5, 1e-4, 1e-3, 0.01, 0.05, 0.1, 0.2, 0.5, 0.8, 1, 1.5, 2, 2.5, 3, 5, 8, 10, 20, 50, 100, 200, 400, 600, 700]
def species(xs=XS, ks=KS, folder=HERE):
    rows, worst = [], 0
    for name, eta in (("boson", -1), ("fermion", 1)):
        for x in xs:
            v = SP.mp_species(x, eta)
            rows.append({"statistics": name, "x": x, **{k: float(v[k]) for k in ("n", "rho", "p", "s", "gN", "gRho", "gP", "gS")}})
            if x >= 0.1:
                b = SP.mp_species_sum(x, eta); worst = max([worst] + [abs(float(b[k] / v[k] - 1)) for k in b])
    bes = []
    with mp.workdps(30):
        for z in ks:
            k = [mp.besselk(n, mp.mpf(z)) for n in (0, 1, 2)]; e = mp.exp(mp.mpf(z))
            bes.append({"z": z, **{"k%d" % n: float(k[n]) for n in range(3)}, **{"scaledK%d" % n: float(k[n] * e) for n in range(3)}})
    save("species.json", {"what": "g = 1, T = 1: n, rho, p, s and effective numbers gN = n/(zeta(3)/pi^2), gRho = rho/(pi^2/30), gP = p/(pi^2/90), gS = s/(2 pi^2/45); modified Bessel K_n(z) and e^z K_n(z)",
        "precision": "correctly rounded doubles (30-digit mpmath quadrature); Bessel-sum cross-check for x >= 0.1: worst %.0e" % worst,
        "species": rows, "bessel": bes}, folder)

# ---- bath -----------------------------------------------------------------------------------------------------------
TS = [1e-5, 2e-5, 5e-5, 1e-4, 2e-4, 3e-4, 5e-4, 7e-4, 9e-4, 1.2e-3, 1.7e-3, 2.5e-3, 4e-3, 7e-3, 0.01, 0.02, 0.03, 0.05, 0.07, 0.09, 0.11,
      0.125, 0.135, 0.142, 0.15, 0.154, 0.16, 0.17, 0.18, 0.2, 0.25, 0.3, 0.4, 0.6, 1, 2, 3, 5, 10, 20, 40, 70, 100, 150, 200, 270, 350, 500, 1000, 1e4]
def bath_rows(b, ts):
    out = []
    for T in ts:
        g, s, d = b(T)
        out.append({"temperatureGeV": T, "gRho": g, "gS": s, "dLnGsDLnT": d, "gStarHalf": s / math.sqrt(g) * (1 + d / 3)})
        gp = b.g_p(T)
        if gp is not None: out[-1]["pressureGeV4"] = math.pi**2 / 90 * gp * T**4
    return out
EXTRA = [("fit-2018", [bathsp("heavy boson", 3, "boson", 0.1)]), ("ideal-switch", [bathsp("light fermion", 4, "fermion", 0.001)]),
         ("lattice-2016", [dec("dark radiation", 2, "boson", 0.0, 5.0)]), ("fit-2018", [dec("hidden fermion", 4, "fermion", 0.02, 1.0)]),
         ("thresholds", [ratio("cool radiation", 2, "fermion", 0.0, 0.5)]),
         ("crossover", [bathsp("partner", 2, "boson", 3.0), dec("relic radiation", 1, "boson", 0.0, 200.0), ratio("warm boson", 1, "boson", 0.3, 0.4)])]
def extra_blocks(ts, extra=EXTRA, baths=BATHS):
    """Rows with extra species: gRho of all radiation, gS what s uses; T_X and Delta N_eff of the species apart in entropy."""
    out = []
    for b, x in extra:
        B = Bath({"bath": baths[b], "neutrinos": NU["specified"], "extraSpecies": x}); rows = bath_rows(B, ts)
        for r in rows:
            rho, p, temps = B.apart(r["temperatureGeV"], r["gS"])
            r["gRho"] += rho; r["gStarHalf"] = r["gS"] / math.sqrt(r["gRho"]) * (1 + r["dLnGsDLnT"] / 3)
            if "pressureGeV4" in r: r["pressureGeV4"] += math.pi**2 / 90 * p * r["temperatureGeV"] ** 4
            r["temperaturesOfSpeciesApartGeV"] = temps
        out.append({"bath": baths[b], "neutrinos": NU["specified"], "extraSpecies": x, "rows": rows})
        apart = [e for e in x if e["coupling"]["kind"] != "bath"]
        if apart and all(e["massGeV"] == 0 for e in apart): out[-1]["deltaNEffAt1KeV"] = B.apart(1e-6, B(1e-6)[1])[0] / (7 / 8 * (4 / 11) ** (4 / 3) * 2)
    return out
def bath(ts=TS, baths=BATHS, extra=EXTRA, bands=(1, -0.5), folder=HERE):
    blocks = []
    for k, b in baths.items():
        own = b["treatment"] not in ("lattice-2016", "fit-2018")
        for nu in ("specified", "instantaneous") + (("linear",) if k == "ideal-switch" else ()) if own else ("specified",):
            for c in [b] + ([{**b, "band": v} for v in bands] if k == "fit-2018" else []):
                B = Bath({"bath": c, "neutrinos": NU[nu]})
                blocks.append({"bath": c, "neutrinos": NU[nu], "gSToday": B.g_s_today(), "gRhoToday": B.g_rho_today(),
                               "lateLimitOfBath": {"gRho": B(1e-12)[0], "gS": B(1e-12)[1]}, "rows": bath_rows(B, ts)})
    lat = baths.get("lattice-2016", BATHS["lattice-2016"])
    nk = bath_rows(Bath({"bath": lat, "neutrinos": NU["specified"]}, "not-a-knot"), ts)
    nat = bath_rows(Bath({"bath": lat, "neutrinos": NU["specified"]}, "natural"), ts)
    cmp = max((abs(a["gRho"] / c["gRho"] - 1), a["temperatureGeV"]) for a, c in zip(nk, nat))
    save("bath.json", {"what": "g_rho, g_s, d ln g_s/d ln T, g_*^{1/2} = (g_s/sqrt g_rho)(1 + delta_s) and the pressure (left out where the specification leaves it open); lattice-2016 with NATURAL end condition",
        "precision": "1e-12 relative for g_rho and g_s, 1e-11 absolute for the derivative (double-exponential quadrature, analytic derivatives; checked against 30-digit mpmath)",
        "splineEnd": {"used": "natural", "worstDifferenceOfGRhoHere": cmp[0], "atTemperatureGeV": cmp[1], "notAKnotRows": nk},
        "blocks": blocks, "extraSpeciesBlocks": extra_blocks(ts[::2], extra, baths)}, folder)

# ---- history --------------------------------------------------------------------------------------------------------
TH = [3e-5, 1e-4, 3e-4, 7e-4, 1.5e-3, 3e-3, 0.01, 0.03, 0.08, 0.13, 0.16, 0.2, 0.5, 2, 10, 50, 120, 250, 1000, 1e4]
LATE = [3e-9, 1e-8, 1e-7, 9e-7, 1.1e-6]
YEAR = 31557600.0                                      # s
def continuity(bath, nu, folder=None):
    """Residual of d(rho a^3) = -p d(a^3) with a from s a^3 = const, relative to rho a^3 at the lower end; QUADPACK in T."""
    from scipy.integrate import quad
    B = Bath({"bath": BATHS[bath], "neutrinos": NU[nu]}); out = []
    rho = lambda T: math.pi**2 / 30 * B(T)[0] * T**4
    a3 = lambda T: 1 / (B(T)[1] * T**3)
    p = lambda T: math.pi**2 / 90 * B.g_p(T) * T**4
    for lo, hi in ((0.01, 0.05), (0.05, 0.14), (0.13, 0.156), (0.157, 0.2), (0.2, 1.0), (1.0, 30.0), (50.0, 400.0), (2.1e-3, 0.01), (5e-4, 1.9e-3), (2e-5, 5e-4)):
        # p d(a^3) = -p a^3 (3 + d ln g_s/d ln T) dT/T
        w = quad(lambda l: (lambda T: p(T) * a3(T) * (3 + B(T)[2]))(math.exp(l)), math.log(lo), math.log(hi), epsabs=0, epsrel=1e-11, limit=300)[0]
        a, b = rho(lo) * a3(lo), rho(hi) * a3(hi)
        out.append({"fromGeV": hi, "toGeV": lo, "changeOfRhoA3": (a - b) / a, "minusIntegralOfPdA3": -w / a, "residual": (a - b + w) / a})
    return {"bath": BATHS[bath], "neutrinos": NU[nu], "intervals": out}
def HISTORY_BLOCKS():
    out = [(hist(b, expansion=ex), TH) for b in ("fit-2018", "lattice-2016") for ex in ({"kind": "radiation"}, FL(2, 0.02), FL(4, 0.1))]
    return out + [(hist(expansion={"kind": "entropy-step", "temperatureGeV": 0.05, "factor": 10}), [0.003, 0.02, 0.049, 0.051, 0.3, 5.0, 200.0]),
        (hist("crossover", extra=[bathsp("heavy boson", 3, "boson", 2.0), dec("dark radiation", 2, "boson", 0.0, 50.0), ratio("cool fermion", 2, "fermion", 0.0, 0.5)], expansion=FL(2, 0.05)),
         [1e-4, 1e-3, 0.01, 0.1, 0.15, 0.2, 1.0, 3.0, 20.0, 100.0, 500.0])]
EARLY = (("fit-2018", 0.02, {"startTemperatureGeV": 10}), ("fit-2018", 0.005, {"startTemperatureGeV": 1000}), ("lattice-2016", 0.02, {"startTemperatureGeV": 10}),
         ("lattice-2016", 1.0, {"startTemperatureGeV": 3000}), ("fit-2018", 10.0, {"startTemperatureGeV": 100}), ("lattice-2016", 0.1, {"dilution": 100}))
def history(folder=HERE, blocks=None, late=(hist("ideal-switch"), hist("fit-2018")), early=EARLY, vacuum=(("fit-2018", 0.02, 1e-6), ("lattice-2016", 1.0, 1e-5))):
    out, ages, em = [], [], []
    def block(sp, ts):
        h = History(sp); out.append({"history": sp, "s0PerCm3": h.s0 / C.HBARC**3, "rows": h.rows(ts)})
    for sp, ts in blocks or HISTORY_BLOCKS(): block(sp, ts)
    for sp in late:
        h = History(sp); z = h.temperature_at(1100)
        block(sp, [h.T0, z] + LATE + [1e-4, 0.01, 1.0, 100.0])
        r = h.rows([h.T0, z]); lone = History(sp); lone.late = lambda T: (0.0, 0.0)
        ages.append({"history": sp, "temperatureAtZ1100GeV": z, "ageAtZ1100Years": r[1]["timeS"] / YEAR, "ageTodayYears": r[0]["timeS"] / YEAR,
                     "ageAtZ1100RadiationAloneYears": lone.rows([z])[0]["timeS"] / YEAR, "hubbleTodayOverH100": r[0]["hubbleGeV"] / C.H100})
    for b, trh, extra in early:
        sp = hist(b, expansion=EM(trh, **extra)); e = EarlyMatter(sp)
        rep = e.report()
        g = e.rad.g(trh)[0]
        mY = e.rad.rho_rad(e.tst) / math.exp(e.s_early)
        rep["scherrerTurnerEstimate"] = 1.83 * g**0.25 * mY * (1 / e.gamma) ** 0.5 / C.M_PL**0.5
        blk = {"history": sp, "outputs": rep}
        if b == "fit-2018" and trh < 1: blk["rows"] = e.rows([e.tst * 5, e.tst, e.tst / 5, e.tst / 30, 4 * trh, trh, trh / 3])
        em.append(blk)
    for b, trh, h0 in vacuum:
        sp = hist(b, expansion=EM(trh, startHubbleGeV=h0))
        em.append({"history": sp, "outputs": MatterFromVacuum(sp).report})
    save("history.json", {"what": "rows of section 11 (densities and H of everything: fluid, field, and below 1e-6 GeV matter and Lambda; gRho all radiation; gS what s uses); decaying matter field; ages; continuity",
        "precision": "H, s, rho, p 1e-12; timeS 1e-10 (Gauss-Legendre from t = 2/((4+n)H) at 1e8 GeV); early-matter about 1e-8 (Radau, rtol 1e-11; t from 1/(2H) at N = -12)",
        "constants": C.as_dict(), "expansions": out, "ages": ages, "earlyMatter": em,
        "continuity": {"what": "d(rho a^3) + p d(a^3) between two temperatures over rho a^3 at the lower one, a from s a^3 = const. Zero above T_dec and for instantaneous neutrinos; what is left for specified ones below T_dec is the heating put into them without taking it from the plasma",
                       "blocks": [continuity(b, nu) for b in ("ideal-switch", "crossover") for nu in ("instantaneous", "specified")]}}, folder)

# ---- thermal averages ----------------------------------------------------------------------------------------------
XR = [1, 3, 10, 20, 25, 40, 100, 1e3, 1e5]
def rate_cases():
    m50 = lambda ann, **k: fo(50, ann, **k)
    return [("cross-section, sqrt(s)^-2", m50(POWER_M2)), ("cross-section, constant", m50({"kind": "cross-section", "points": [[100, 2e-9], [1e8, 2e-9]]})),
            ("cross-section, table", m50(TABLE)), ("resonance above threshold, G/M=1e-3", m50(res(105, 0.105, 1, 1e-5))),
            ("resonance above threshold, G/M=1e-6, Dirac", m50(res(105, 1.05e-4, 1, 1e-2), g=4, sc=False)), ("Coulomb alpha=0.03", fo(1000, somm(2e-26, 0.03))),
            ("Hulthen alpha=0.03 m_phi=1", fo(1000, somm(2e-26, 0.03, 1.0))), ("Hulthen near resonance", fo(2000, somm(5e-27, 0.05, 15.0))),
            ("coannihilation exact", COANN("exact")), ("coannihilation nonrelativistic", COANN("nonrelativistic"))]
def rates(cs=None, scat=None, xs=XR, folder=HERE):
    from scipy.special import kve
    import crosscheck as X
    out, worst = [], 0
    for name, c in cs or rate_cases():
        r = RT.Rate(c); f = getattr(r, "direct", r.f); rows = []
        other = X.cross_section(c)[0] if X.able({"input": {"candidate": c, "history": hist()}}) else None
        for x in xs:
            v = f(x); rows.append({"x": x, "sigmaVCm3PerS": v / C.CM3_PER_S})
            if other: worst = max(worst, abs(other(c["massGeV"] / x) / v - 1))
        out.append({"name": name, "candidate": c, "rows": rows})
    sc = []
    for name, q, mx in scat or SCATTERINGS:
        s, knots = (RT.loglog(q["points"]), [p[0] for p in q["points"]]) if q["kind"] == "table" else ((lambda r: q["crossSectionGeVMinus2"] * (r / q["referenceEnergyGeV"]) ** q["exponent"]), ())
        lo, o = X.scattering(q, mx); rows = []
        for T in (1, 3, 10, 30, 100, 300, 1000, 3000):
            v = RT.scattering_rate(T, s, q["incoming"], mx, knots); rows.append({"temperatureGeV": T, "productionGeV4": v})
            worst = max(worst, abs(o(lo / T) * math.exp(-lo / T) / v - 1))
        sc.append({"name": name, "scattering": q, "massGeV": mx, "rows": rows})
    save("rates.json", {"what": "<sigma v>(x) of the annihilation models and gamma(T) of scatterings", "precision": "1e-10; worst difference from QUADPACK (crosscheck.py) %.0e" % worst,
        "annihilation": out, "scattering": sc}, folder)

# ---- abundance ------------------------------------------------------------------------------------------------------
def pw(a, b=0.0): return {"kind": "partial-waves", "sWaveCm3PerS": a, "pWaveCm3PerS": b}
def fo(m, ann, g=2, st="fermion", sc=True, **k):
    return {"mechanism": "freeze-out", "massGeV": m, "degreesOfFreedom": g, "statistics": st, "selfConjugate": sc, "annihilation": ann, **k}
def fid(mx, mb, tau, st="boson", gb=1, g=2, xst="fermion", **k):
    par = {"massGeV": mb, "degreesOfFreedom": gb, "statistics": st, "lifetimeS": tau}
    par.update(k.pop("parent", {}))
    return {"mechanism": "freeze-in-decay", "massGeV": mx, "degreesOfFreedom": g, "statistics": xst, "parent": par, "perDecay": k.pop("perDecay", 1), **k}

def res(mr, gr, j, b): return {"kind": "resonance", "massGeV": mr, "widthGeV": gr, "spin": j, "branchingProduct": b}
def somm(a, al, mphi=None): return {"kind": "sommerfeld", "sWaveCm3PerS": a, "couplingAlpha": al, **({"mediatorMassGeV": mphi} if mphi else {})}
def COANN(w, **k): return fo(200, {"kind": "coannihilation", "weights": w, "others": [{"massGeV": 210, "degreesOfFreedom": 4, "statistics": "fermion"}],
        "pairs": [{"first": 0, "second": 0, "sWaveCm3PerS": 1e-27}, {"first": 0, "second": 1, "sWaveCm3PerS": 3e-26}, {"first": 1, "second": 1, "sWaveCm3PerS": 1e-25, "pWaveCm3PerS": 2e-25}]}, **k)
POWER_M2 = {"kind": "cross-section", "points": [[100, 5e-9], [1e8, 5e-21]]}       # two rows: sigma = 5e-9 (sqrt(s)/100 GeV)^-2 exactly
TABLE = {"kind": "cross-section", "points": [[100, 1e-9], [102, 1.1e-9], [105, 2e-9], [110, 8e-9], [112, 1e-8], [115, 6e-9], [130, 1.5e-9], [200, 6e-10], [1000, 2e-11]]}
def scat(m, q, g=2, st="fermion"): return {"mechanism": "freeze-in-scattering", "massGeV": m, "degreesOfFreedom": g, "statistics": st, "scattering": q}
def power(s0, e0, k, *inc): return {"kind": "power-law", "crossSectionGeVMinus2": s0, "referenceEnergyGeV": e0, "exponent": k, "incoming": [{"massGeV": m, "degreesOfFreedom": g} for m, g in inc]}
def stable(pts, *inc): return {"kind": "table", "points": pts, "incoming": [{"massGeV": m, "degreesOfFreedom": g} for m, g in inc]}
SCATTERINGS = [("power-law -4", power(5e-27, 200.0, -4, (80, 2), (60, 1)), 10), ("power-law +1", power(2.4e-31, 200.0, 1, (30, 4), (0, 2)), 5),
               ("table", stable([[150, 2e-29], [200, 4e-28], [300, 1.2e-27], [500, 6e-28], [1000, 1e-28], [1e4, 4e-31]], (80, 2), (60, 1)), 10)]
def ann_parent(m, tau, sv, g=1, st="boson", mx=1.0, pw_=0.0, sc=True, **k): return fid(mx, m, tau, st, g, parent={"selfConjugate": sc, "annihilation": pw(sv, pw_)}, **k)
def cases():
    c = []
    add = lambda name, h, cand: c.append((name, {"history": h, "candidate": cand}))
    for b in ("fit-2018", "lattice-2016", "thresholds"):
        for m in (0.1, 10, 1000): add("s-wave %s m=%g" % (b, m), hist(b), fo(m, pw(2.2e-26)))
    add("s-wave ideal-switch m=5 instantaneous neutrinos", hist("ideal-switch", "instantaneous"), fo(5, pw(3e-26)))
    add("s-wave crossover m=3 Maxwell-Boltzmann", hist("crossover"), fo(3, pw(3e-26), equilibriumStatistics="maxwell-boltzmann"))
    add("s-wave m=1e4 scalar g=1", hist(), fo(1e4, pw(2e-26), g=1, st="boson"))
    add("p-wave fit-2018 m=100", hist(), fo(100, pw(0, 2e-25)))
    add("p-wave thresholds m=1", hist("thresholds"), fo(1, pw(0, 3e-25)))
    add("p-wave lattice-2016 m=5000 s+p", hist("lattice-2016"), fo(5000, pw(5e-27, 1e-25)))
    add("Dirac (g=4 both) m=100", hist(), fo(100, pw(4.4e-26), g=4, sc=False))
    add("complex scalar (g=2 both) m=1 lattice", hist("lattice-2016"), fo(1, pw(8e-26), g=2, st="boson", sc=False))
    add("power-law n=2 m=50", hist(), fo(50, {"kind": "power-law", "coefficientCm3PerS": 3e-23, "exponent": 2}))
    add("coannihilation exact weights 5 %", hist(), COANN("exact"))
    add("coannihilation nonrelativistic weights 5 %", hist(), COANN("nonrelativistic"))
    add("coannihilation, selfConjugate false is ignored", hist(), COANN("exact", sc=False))
    add("resonance above threshold, G/M=1e-3", hist(), fo(50, res(105, 0.105, 1, 1e-5)))
    add("resonance above threshold, G/M=1e-6", hist(), fo(50, res(105, 1.05e-4, 1, 1e-2)))
    add("resonance broad, below threshold", hist("thresholds"), fo(50, res(91.188, 2.4955, 1, 2.5e-6)))
    add("Sommerfeld alpha=0.03 m=1000", hist(), fo(1000, somm(2e-26, 0.03)))
    add("fluid n=2 m=100 s-wave", hist(expansion={"kind": "fluid", "index": 2, "equalityTemperatureGeV": 0.02}), fo(100, pw(2e-24)))
    add("fluid n=4 m=100 p-wave", hist("lattice-2016", expansion={"kind": "fluid", "index": 4, "equalityTemperatureGeV": 0.1}), fo(100, pw(0, 1e-21)))
    add("early-matter m=100 s-wave", hist(expansion={"kind": "early-matter", "reheatTemperatureGeV": 0.02, "startTemperatureGeV": 10}), fo(100, pw(5e-29)))
    add("early-matter dilution given, m=500", hist("lattice-2016", expansion={"kind": "early-matter", "reheatTemperatureGeV": 0.1, "dilution": 100}), fo(500, pw(5e-28)))
    add("entropy-step D=10", hist(expansion={"kind": "entropy-step", "temperatureGeV": 0.05, "factor": 10}), fo(100, pw(2.2e-27)))
    for mx, tau in ((1e-5, 1e-9), (0.01, 1e-6), (100, 7e-3)): add("freeze-in decay m_X=%g" % mx, hist(), fid(mx, 300, tau))
    add("freeze-in decay fermion parent lattice", hist("lattice-2016"), fid(1, 300, 1e-4, "fermion", 4, perDecay=2))
    add("freeze-in decay MB parent thresholds", hist("thresholds"), fid(1, 300, 1e-4, "maxwell-boltzmann", 1))
    add("freeze-in decay light parent across QCD", hist("lattice-2016"), fid(1e-4, 0.5, 2.4e-2))
    add("freeze-in decay, back-reaction, thermalising", hist(), fid(1e-7, 300, 1e-12, backReaction=True))
    add("freeze-in decay, maximum temperature 30 GeV", hist(tmax=30), fid(1e-3, 300, 1e-7))
    add("freeze-in decay fluid n=2", hist(expansion={"kind": "fluid", "index": 2, "equalityTemperatureGeV": 0.5}), fid(1e-3, 300, 1e-10))
    add("freeze-in decay early-matter", hist(expansion={"kind": "early-matter", "reheatTemperatureGeV": 5, "startTemperatureGeV": 1000}), fid(1e-3, 300, 1e-9))
    add("superposed late decay", hist(), fid(10, 300, 0.01, parent={"selfConjugate": True, "annihilation": pw(1e-25)}))
    add("freeze-in scattering constant M2", hist(), {"mechanism": "freeze-in-scattering", "massGeV": 100, "degreesOfFreedom": 1, "statistics": "boson", "scattering": {"kind": "constant-matrix-element", "matrixElementSquared": 1e-21}})
    add("ultraviolet q=1", hist(tmax=1e6), {"mechanism": "freeze-in-ultraviolet", "massGeV": 100, "degreesOfFreedom": 2, "statistics": "fermion", "ultraviolet": {"coefficient": 1e-2, "scaleGeV": 6e15, "index": 1}})
    add("ultraviolet q=2", hist("thresholds", tmax=1e8), {"mechanism": "freeze-in-ultraviolet", "massGeV": 1000, "degreesOfFreedom": 2, "statistics": "fermion", "ultraviolet": {"coefficient": 1, "scaleGeV": 1e13, "index": 2}})
    for eta in (1e-11, 4e-11): add("asymmetric eta=%g" % eta, hist(), {"mechanism": "asymmetric", "massGeV": 10, "degreesOfFreedom": 4, "statistics": "fermion", "selfConjugate": False, "asymmetry": eta, "annihilation": pw(5e-26)})
    add("hot relic", hist("ideal-switch"), {"mechanism": "hot-relic", "massGeV": 1e-8, "degreesOfFreedom": 2, "statistics": "fermion", "decouplingTemperatureGeV": 0.1})
    add("hot relic fit-2018 boson", hist(), {"mechanism": "hot-relic", "massGeV": 2e-7, "degreesOfFreedom": 1, "statistics": "boson", "decouplingTemperatureGeV": 500})
    add("resonance, Dirac candidate, G/M=1e-2", hist("lattice-2016"), fo(200, res(412, 4.0, 1, 4e-4), g=4, sc=False))
    add("extra species in the bath", hist(extra=[bathsp("partner", 4, "fermion", 20)]), fo(150, pw(2.4e-26)))
    add("extra species in the bath, thresholds", hist("thresholds", extra=[bathsp("partner", 3, "boson", 2)]), fo(30, pw(2.4e-26)))
    add("extra species decoupled, massless", hist(extra=[dec("dark radiation", 2, "boson", 0.0, 50)]), fo(60, pw(2.4e-26)))
    add("extra species decoupled, massive", hist("lattice-2016", extra=[dec("hidden fermion", 4, "fermion", 0.3, 20)]), fid(1e-3, 40, 1e-6))
    add("extra species at a fixed ratio", hist("thresholds", extra=[ratio("cool radiation", 4, "fermion", 0.0, 0.5)]), fo(100, pw(2.4e-26)))
    add("extra species at a fixed ratio, massive, fluid n=2", hist("crossover", expansion=FL(2, 0.1), extra=[ratio("cool boson", 3, "boson", 0.4, 0.7)]), fo(20, pw(4e-25)))
    add("extra species of all three kinds", hist("ideal-switch", extra=[bathsp("partner", 2, "boson", 5), dec("dark radiation", 1, "boson", 0.0, 200), ratio("cool fermion", 2, "fermion", 1.0, 0.6)]), fo(80, pw(0, 3e-25)))
    add("band +1 m=10", hist(band=1), fo(10, pw(2.2e-26)))
    add("band -0.5 p-wave m=30", hist(band=-0.5), fo(30, pw(0, 3e-25)))
    add("band +1 freeze-in across QCD", hist(band=1), fid(1e-4, 0.5, 2.4e-2))
    add("band +0.3 m=2e4, above the table", hist(band=0.3), fo(2e4, pw(2.2e-26)))
    add("hadrons long in ideal-switch, m=2.5", hist("ideal-switch", hadrons="long"), fo(2.5, pw(3e-26)))
    add("Hulthen alpha=0.03 m_phi=1 m=1000", hist(), fo(1000, somm(2e-26, 0.03, 1.0)))
    add("Hulthen near its second resonance", hist("lattice-2016"), fo(2000, somm(2e-26, 0.05, 15.0)))
    add("cross-section sqrt(s)^-2 (two rows)", hist(), fo(50, POWER_M2))
    add("cross-section table", hist(), fo(50, TABLE))
    for n, q, m, k in zip(("sqrt(s)^-4, massive", "sqrt(s)^1, maximum temperature", "table"), SCATTERINGS, (10, 5, 10), (None, 5e3, None)):
        add("freeze-in scattering " + n, hist(tmax=k), scat(m, q[1]))
    add("freeze-in scattering power law in early matter", hist(expansion=EM(5, startTemperatureGeV=1000)), scat(10, power(4e-24, 200.0, -4, (80, 2), (60, 1))))
    for r, tau, sv, st, g in ((0.1, 3.2e-9, 2e-34, "maxwell-boltzmann", 2), (1, 2.7e-10, 2e-34, "boson", 1), (10, 3.2e-11, 2e-34, "fermion", 2)):
        add("parent annihilates and decays, width/H = %g" % r, hist(), ann_parent(300, tau, sv, g, st, 1e-5))
    add("parent annihilates and decays, width/H = 1, s-wave 1e-26", hist("lattice-2016"), ann_parent(300, 2e-9, 1e-26, 2, "maxwell-boltzmann", 1e-5))
    add("parent annihilates and decays, late, two per decay", hist(), ann_parent(500, 1e-3, 2e-29, 4, "fermion", 0.2, sc=False, perDecay=2))
    add("back-reaction with two per decay", hist(), fid(1e-6, 300, 5e-11, perDecay=2, backReaction=True))
    add("back-reaction with two per decay, fermion parent", hist("lattice-2016"), fid(3e-6, 120, 2e-10, "fermion", 2, perDecay=2, backReaction=True))
    add("linear entropy scaling m=100", hist(nu="linear"), fo(100, pw(2.2e-26)))
    add("linear entropy scaling, ideal-switch, freeze-out below 2 MeV", hist("ideal-switch", "linear"), fo(0.02, pw(4e-26)))
    add("heated entropy scaling, ideal-switch, freeze-out below 2 MeV", hist("ideal-switch"), fo(0.02, pw(4e-26)))
    add("freeze-out from zero abundance, thermalises", hist(), fo(100, pw(2.2e-26), initialAbundance="zero"))
    add("freeze-out from zero abundance, never thermal", hist(), fo(100, pw(3e-46), initialAbundance="zero", startX=0.5))
    add("freeze-out from zero abundance, half thermal, T_max 20 GeV", hist("lattice-2016", tmax=20), fo(100, pw(1e-33), initialAbundance="zero"))
    add("maximum temperature below twice the mass", hist(tmax=150), fo(100, pw(2.2e-26)))
    add("maximum temperature m/26, from equilibrium", hist(tmax=100 / 26), fo(100, pw(2.2e-26)))
    add("maximum temperature m/26, from zero", hist(tmax=100 / 26), fo(100, pw(2.2e-26), initialAbundance="zero"))
    add("entropy step below freeze-out of a p-wave, T_D near T_f", hist(expansion={"kind": "entropy-step", "temperatureGeV": 2.0, "factor": 4}), fo(60, pw(0, 1e-25)))
    return c

SECOND = {"freeze-out": "DOP853 rtol 1e-12 from Gamma/H = 3000", "freeze-in-decay": "Radau rtol 1e-10 ODE against quadrature",
          "freeze-in-scattering": "Radau rtol 1e-10 ODE against quadrature", "freeze-in-ultraviolet": "Radau rtol 1e-10 ODE against quadrature",
          "asymmetric": "DOP853 rtol 1e-12 from rate = 3000 H"}
def run_case(case):
    name, inp = case
    t = time.time()
    try:
        o = R.abundance(inp)
        c = inp["candidate"]; mech = c["mechanism"]
        em = inp["history"]["expansion"]["kind"] == "early-matter"
        zero, both = c.get("initialAbundance") == "zero", "annihilation" in c.get("parent", {})
        ode = mech in ("freeze-out", "asymmetric") or both or c.get("backReaction")
        rec = {"name": name, "input": inp, "outputs": o, "method": "closed form" if mech == "hot-relic" else "Radau rtol 1e-10 (joint system)" if em else "Radau rtol 1e-%d" % (10 if c.get("backReaction") else 11) if ode else "Gauss-Legendre quadrature"}
        if mech in SECOND:
            o2 = R.abundance(inp, True)
            rec["secondMethod"] = "BDF rtol 1e-12" + (" (joint system)" if em else "") if em or zero or both or c.get("backReaction") else SECOND[mech]
            rec["secondOmegaH2"] = o2["omegaH2"]
            d = abs(o2["omegaH2"] / o["omegaH2"] - 1)
            rec["relativeDifference"] = d
            rec["accuracy"] = float("%.0e" % max(3 * d, 1e-10))
        else: rec["accuracy"] = 1e-12
        if both: rec["sumOfLimitsOverOmegaH2"] = (o["yieldFreezeIn"] + o["yieldLateDecay"]) / o["yieldToday"]
        print("%-60s %.10e  diff %.1e  %.1f s" % (name, o["omegaH2"], rec.get("relativeDifference", 0), time.time() - t), flush=True)
        return rec
    except Exception as e:
        import traceback; traceback.print_exc(); print("FAILED", name, repr(e), flush=True)
def run_cases(cs, file="abundance.json", folder=HERE, what=""):
    assert len({n for n, _ in cs}) == len(cs)
    with Pool(2) as pool: out = [r for r in pool.imap(run_case, cs, 1) if r]
    save(file, {"what": what or "inputs in the wire form of the conventions, section 11; accuracy is relative, for omegaH2",
                "constants": C.as_dict(), "cases": out}, folder)

def merge_crosscheck(folder=HERE):
    """Writes the result of crosscheck.py into abundance.json and widens the stated accuracy where it must."""
    p = os.path.join(folder, "abundance.json")
    doc, cc = json.load(open(p)), json.load(open(os.path.join(folder, "crosscheck.json")))["cases"]
    for k in doc["cases"]:
        if "relativeDifference" in k: k["accuracy"] = float("%.0e" % max(3 * k["relativeDifference"], 1e-10))
        if k["name"] in cc:
            k["independentOmegaH2"] = cc[k["name"]]["omegaH2"]
            k["independentDifference"] = cc[k["name"]]["relativeDifference"]
            k["accuracy"] = max(k["accuracy"], float("%.0e" % abs(1.5 * k["independentDifference"])))
        if k["accuracy"] > 1e-12: k["accuracy"] = max(k["accuracy"], 2e-9)     # floor: level reached by the independent solver
    with open(p, "w") as f: json.dump(doc, f, indent=1, allow_nan=False); f.write("\n")

# ---- attribution and elasticities ----------------------------------------------------------------------------------
GROUPS = {"bath": "bath", "neutrinos": "neutrinos", "extraSpecies": "extraSpecies", "expansion": "expansion", "maximumTemperature": "maximumTemperatureGeV", "today": "today"}
def ln_omega(inp, second=False): return math.log(R.abundance(inp, second)["omegaH2"])
def attribution_of(case):
    """Exact Shapley values of ln omegaH2 over the groups that differ, from all subsets."""
    name, base, var, cand, elastic = case
    t = time.time()
    diff = [g for g, k in GROUPS.items() if base[k] != var[k]]
    v = {}
    for n in range(len(diff) + 1):
        for S in itertools.combinations(diff, n):
            h = {**base, **{GROUPS[g]: var[GROUPS[g]] for g in S}}
            v[frozenset(S)] = ln_omega({"history": h, "candidate": cand})
    n, parts = len(diff), []
    for g in GROUPS:
        x = 0.0
        if g in diff:
            rest = [d for d in diff if d != g]
            for k in range(n):
                for S in itertools.combinations(rest, k):
                    x += math.factorial(k) * math.factorial(n - 1 - k) / math.factorial(n) * (v[frozenset(S) | {g}] - v[frozenset(S)])
        parts.append({"group": g, "lnFactor": x, "factor": math.exp(x)})
    # the same by the mean over all orders
    other = {g: 0.0 for g in diff}
    for order in itertools.permutations(diff):
        S = frozenset()
        for g in order: other[g] += (v[S | {g}] - v[S]) / math.factorial(n); S |= {g}
    total = v[frozenset(diff)] - v[frozenset()]
    check = max([abs(p["lnFactor"] - other[p["group"]]) for p in parts if p["group"] in other] + [abs(sum(p["lnFactor"] for p in parts) - total)])
    assert check < 1e-12, check
    out = {"name": name, "input": {"baseline": base, "variant": var, "candidate": cand},
           "outputs": {"ratio": math.exp(total), "parts": parts, "oneAtATime": [{"group": g, "lnFactor": v[frozenset({g})] - v[frozenset()] if g in diff else 0.0} for g in GROUPS]},
           "subsets": [{"groups": [g for g in GROUPS if g in S], "omegaH2": math.exp(x)} for S, x in v.items()], "sumCheck": check, "accuracy": 1e-8}
    if elastic: out["outputs"]["elasticities"], out["elasticityAccuracies"] = elasticities({"history": var, "candidate": cand}, elastic)
    print("attribution", name, len(v), "subsets, ratio %.10f, %.1f s" % (math.exp(total), time.time() - t), flush=True)
    return out
def elasticities(inp, paths):
    """d ln omegaH2/d ln p: central differences of order 6 with steps h and 2h in ln p; the difference is the accuracy; h is halved
    until that is below 1e-6."""
    def at(path, f):
        q = json.loads(json.dumps(inp)); *way, last = path.split("."); o = q
        for w in way: o = o[int(w)] if isinstance(o, list) else o[w]
        o[last] *= f; return ln_omega(q)
    out, acc = [], []
    floor = 1e-7 if inp["history"]["expansion"]["kind"] == "early-matter" else 1e-8
    for p in paths:
        for h in (0.008, 0.004, 0.002, 0.001, 0.0005):
            v = {k: at(p, math.exp(k * h)) for k in (1, 2, 3, 4, 6, -1, -2, -3, -4, -6)}
            d = lambda s: sum(c * (v[s * k] - v[-s * k]) for k, c in ((1, 3 / 4), (2, -3 / 20), (3, 1 / 60))) / (s * h)
            if abs(d(1) - d(2)) < 1e-6: break
        out.append({"path": p, "value": d(1)}); acc.append({"path": p, "accuracy": float("%.0e" % max(abs(d(1) - d(2)), floor))})
    return out, acc
def mix(base, **k): return {**base, **k}
def attribution_cases():
    fit, th = hist(), hist("thresholds")
    kin = hist("lattice-2016", nu="linear", expansion=FL(2, 0.4))
    all6 = {**hist("crossover", "instantaneous", FL(1, 0.3), [dec("dark radiation", 2, "boson", 0.0, 60)], 40.0), "today": {**TODAY, "temperatureK": 2.73}}
    return [("thresholds to fit-2018 with kination, s-wave", th, hist(expansion=FL(2, 1.15)), fo(100, pw(4.1e-26)),
             ["candidate.massGeV", "candidate.annihilation.sWaveCm3PerS", "history.expansion.equalityTemperatureGeV", "history.expansion.index", "history.neutrinos.nEff", "history.today.temperatureK"]),
            ("bath, neutrinos and extra species, p-wave across the transition", hist("ideal-switch", "instantaneous"), hist("crossover", extra=[ratio("cool fermion", 4, "fermion", 0.0, 0.6)]), fo(2.8, pw(0, 3e-25)),
             ["candidate.massGeV", "candidate.annihilation.pWaveCm3PerS", "history.extraSpecies.0.coupling.ratio", "history.bath.transitionWidthGeV"]),
            ("all six groups, freeze-in by decay", th, all6, fid(1e-3, 150, 1e-8),
             ["candidate.massGeV", "candidate.parent.massGeV", "candidate.parent.lifetimeS", "history.maximumTemperatureGeV", "history.expansion.equalityTemperatureGeV", "history.bath.transitionTemperatureGeV"]),
            ("early matter and band, s-wave", fit, hist(band=1, expansion=EM(0.05, startTemperatureGeV=20)), fo(200, pw(4e-28)),
             ["candidate.massGeV", "candidate.annihilation.sWaveCm3PerS", "history.expansion.reheatTemperatureGeV", "history.expansion.startTemperatureGeV", "history.bath.band"])]
def attribution(cs=None, folder=HERE):
    with Pool(2) as pool: out = pool.map(attribution_of, cs or attribution_cases(), 1)
    save("attribution.json", {"what": "exact Shapley values of ln omegaH2 between two histories, by all subsets of the groups that differ (equal to the mean over all orders to 1e-12; sumCheck); elasticities d ln omegaH2/d ln p of the variant, each with its accuracy (order 6, two steps)",
        "precision": "lnFactor 1e-8 absolute (each omegaH2 2e-9; early matter 1e-8)", "cases": out}, folder)

# ---- inverse --------------------------------------------------------------------------------------------------------
def needed_sigma(h_spec, m, target=C.TARGET, g=2, second=False):
    """s-wave <sigma v> in cm^3/s for which omegaH2 = target: secant in logarithms."""
    return solve_log(lambda l: ln_omega({"history": h_spec, "candidate": fo(m, pw(math.exp(l)), g=g)}, second) - math.log(target), math.log(2.2e-26))
def solve_log(f, l0, slope=-1.0):
    f0 = f(l0); l1 = l0 - f0 / slope; f1 = f(l1)
    for _ in range(14):
        if abs(f1) < 3e-11: break
        l0, l1, f0 = l1, l1 - f1 * (l1 - l0) / (f1 - f0), f1
        f1 = f(l1)
    assert abs(f1) < 1e-9
    return math.exp(l1)
def put(inp, path, value):
    q = json.loads(json.dumps(inp)); *way, last = path.split("."); o = q
    for w in way: o = o[int(w)] if isinstance(o, list) else o[w]
    if value is None: o.pop(last, None)
    else: o[last] = value
    return q
def inverse_case(job):
    """(input, path, brackets [lo, hi] in which one solution lies each, target, range searched) -> record."""
    from scipy.optimize import brentq
    inp, path, brackets, target, *span = job
    f = lambda l: ln_omega(put(inp, path, math.exp(l))) - math.log(target)
    sol = []
    for lo, hi in brackets:
        if lo == hi: sol.append(solve_log(f, math.log(lo)))
        else: sol.append(math.exp(brentq(f, math.log(lo), math.log(hi), xtol=1e-11, rtol=1e-14)))
    print("inverse", path, sol, flush=True)
    return {"input": {**put(inp, path, None), "solveFor": path, "targetOmegaH2": target}, "solutions": sol, **({"searched": span[0]} if span else {})}
def inverse_jobs(masses=(0.1, 0.3, 1, 5, 10, 100, 1000, 1e4), baths=("fit-2018", "thresholds"), xs=(1e-5, 1e-4, 1e-3, 0.1, 10, 100), mb=300, dof=2, lb="fit-2018", eta="boson", more=None):
    sv, tau = "candidate.annihilation.sWaveCm3PerS", "candidate.parent.lifetimeS"
    jobs = [({"history": hist(b), "candidate": fo(m, pw(2.2e-26), g=dof)}, sv, [(2.2e-26, 2.2e-26)], C.TARGET) for b in baths for m in masses]
    for mx in xs:
        i = {"history": hist(lb), "candidate": fid(mx, mb, 1.0, eta)}; t = math.exp(ln_omega(i)) / C.TARGET
        jobs.append((i, tau, [(t, t)], C.TARGET))
    return jobs + (MORE_INVERSE() if more is None else more)
def MORE_INVERSE():
    sv = "candidate.annihilation.sWaveCm3PerS"
    return [({"history": hist(), "candidate": fo(100, pw(2.2e-26), initialAbundance="zero")}, sv, [(1e-48, 1e-42), (1e-27, 1e-24)], C.TARGET, [1e-50, 1e-20]),
            ({"history": hist(), "candidate": fo(50, res(105, 0.105, 1, 1e-5))}, "candidate.massGeV", [(49, 50), (52.6, 53.2)], C.TARGET, [40, 60]),
            ({"history": hist(expansion=EM(0.02, startTemperatureGeV=10)), "candidate": fo(100, pw(5e-29))}, "history.expansion.reheatTemperatureGeV", [(0.005, 0.1)], C.TARGET, [0.004, 1]),
            ({"history": hist(expansion={"kind": "entropy-step", "temperatureGeV": 0.05, "factor": 10}), "candidate": fo(100, pw(1e-27))}, "history.expansion.factor", [(1.5, 200)], C.TARGET, [1, 1000]),
            ({"history": hist(), "candidate": ann_parent(300, 1e-9, 2e-27, 1, "boson", 20.0)}, "candidate.parent.lifetimeS", [(1e-4, 1.0)], C.TARGET, [1e-6, 10])]
def inverse(jobs=None, folder=HERE):
    with Pool(2) as pool: out = pool.map(inverse_case, jobs or inverse_jobs(), 1)
    save("inverse.json", {"what": "solutions of omegaH2 = target, ascending: all of them, within `searched` where it is given", "precision": "1e-9 relative", "cases": out}, folder)

# ---- published ------------------------------------------------------------------------------------------------------
def published(folder=HERE):
    P = []
    def add(name, pub, own, source, tag="P", note="", tol=None):
        P.append({"name": name, "published": pub, "own": float(own), "relativeDifference": float(own / pub - 1), "source": source, "tag": tag, **({"agrees": bool(abs(own / pub - 1) <= tol)} if tol is not None else {}), **({"note": note} if note else {})})
    th = Bath({"bath": BATHS["thresholds"], "neutrinos": NU["instantaneous"]})
    for T, g in ((200, 106.75), (150, 96.25), (50, 86.25), (3, 75.75), (1.5, 72.25), (0.5, 61.75), (0.15, 17.25), (0.12, 14.25), (0.01, 10.75)):
        add("g at T = %g GeV, steps" % T, g, th(T)[0], "PDG, KT", tol=1e-12)
    add("g_rho today, N_eff=3", 3.363, th.g_rho_today(), "PDG, KT", tol=2e-4); add("g_s today, N_eff=3", 3.909, th.g_s_today(), "PDG, KT", tol=2e-4)
    sp = Bath({"bath": BATHS["thresholds"], "neutrinos": NU["specified"]})
    add("g_rho today, N_eff=3.044", 3.383, sp.g_rho_today(), "spec section 3", "C", tol=2e-4); add("g_s today, N_eff=3.044", 3.930, sp.g_s_today(), "spec section 3 (heated); SS20 has 3.931", tol=2e-4)
    add("g_s today, N_eff=3.044, linear", 3.937, Bath({"bath": BATHS["thresholds"], "neutrinos": NU["linear"]}).g_s_today(), "spec section 3", "C", tol=2e-4)
    T0 = C.T0_K * C.K_B
    s0 = 2 * math.pi**2 / 45 * 43 / 11 * T0**3
    add("s0 in cm^-3, g_s = 43/11", 2891.2, s0 / C.HBARC**3, "PDG", tol=3e-5)
    add("n_gamma in cm^-3", 410.73, 2 * C.ZETA3 / math.pi**2 * T0**3 / C.HBARC**3, "PDG", tol=3e-5)
    add("rho_c/h^2 in GeV cm^-3", 1.053672e-5, C.RHO_C_CM3, "PDG", tol=3e-6)
    add("M_Pl", 1.220890e19, C.M_PL, "PDG", tol=1e-6); add("reduced M_Pl", 2.435323e18, C.M_PL / math.sqrt(8 * math.pi), "PDG", tol=1e-6)
    add("omegaH2/(m Y0) per GeV", 2.744e8, s0 / C.RHO_C, "spec section 7", tol=3e-4)
    add("HQ14 p/T^4 at 400 MeV", 3.79, __import__("bath").hq14(0.4).v, "spec section 3", "M", tol=1e-3)
    add("HQ14 p/T^4 at high T", 5.209, __import__("bath").hq14(1e5).v, "spec section 3", "M", tol=1e-3)
    pre = 45 * 3 * C.M_PL / (1.66 * 8 * math.pi**3)
    k = s0 / C.RHO_C
    add("freeze-in decay closed form: omegaH2 prefactor 1.09e27", 1.09e27, k * pre, "HJMW10", tol=0.01)
    G = lambda om: om * 100**1.5 * 300**2 / (k * pre * 100)
    for om in (0.11, 0.12): add("lifetime prefactor 7.7e-3 s for omegaH2 = %g" % om, 7.7e-3, C.HBAR / G(om), "HJMW10", note="the prefactor matches omegaH2 = %.3f, not the present 0.12" % (C.HBAR / 7.7e-3 / G(1.0)), tol=0.03)
    # 2.42 (MeV/T)^2 s
    add("t = k g^-1/2 (T/MeV)^-2 s, k", 2.42, C.HBAR * 1e6 * C.M_PL / 2 * math.sqrt(90 / (8 * math.pi**3)), "KT", tol=2e-3)
    h = History(hist("thresholds"))
    T = 1e3; f = (h.s0 / h.entropy(T)) ** (1 / 3) * h.H(T) / (2 * math.pi) / C.HBAR
    add("frequency prefactor 2.654e-8 Hz at g = 106.75 (g_s today 3.930)", 2.654e-8, f / T, "SS18", tol=1e-3)
    n_nu = 3 / 11 * 2 * C.ZETA3 / math.pi**2 * T0**3
    add("sum m_nu/(omegaH2) in eV, N_eff=3 instantaneous", 94.1, C.RHO_C / n_nu * 1e9, "PDG", tol=1e-3)
    add("sum m_nu/(omegaH2) in eV, N_eff=3.044 scaled as (N_eff/3)^{3/4}", 93.12, C.RHO_C / n_nu * 1e9 / (3.044 / 3) ** 0.75, "PDG", note="PDG value rests on detailed decoupling", tol=3e-3)
    e = EarlyMatter(hist(expansion={"kind": "early-matter", "reheatTemperatureGeV": 0.02, "startTemperatureGeV": 1000}))
    mY = e.rad.rho_rad(e.tst) / math.exp(e.s_early)
    c0 = C.M_PL**0.5 * e.gamma**0.5 / mY * e.D
    add("dilution prefactor 1.83 <g^{1/3}>^{3/4}, with g = g_rho(T_RH = 20 MeV)", 1.83, c0 / e.rad.g(0.02)[0] ** 0.25, "ST85", tol=0.02)
    # closed forms at constant g (thresholds bath far above the top quark), with sqrt(4 pi^3/45) in place of 1.66
    k166 = math.sqrt(4 * math.pi**3 / 45); gg = 106.75
    hs = hist("thresholds")
    Y = 135 * C.M_PL * (C.HBAR / 1e-9) / (k166 * 8 * math.pi**3 * gg**1.5 * (1e6) ** 2)
    own = R.abundance({"history": hs, "candidate": fid(1, 1e6, 1e-9, "maxwell-boltzmann", 1)})["yieldToday"]
    add("freeze-in decay closed form Y, m_B = 1e6 GeV, g = 106.75, MB", Y, own, "HJMW10", tol=1e-6)
    Y = 45 * C.M_PL * 1e-20 / (512 * math.pi**6 * k166 * gg**1.5 * 1e6)
    own = R.abundance({"history": hs, "candidate": {"mechanism": "freeze-in-scattering", "massGeV": 1e6, "degreesOfFreedom": 1, "statistics": "boson", "scattering": {"kind": "constant-matrix-element", "matrixElementSquared": 1e-20}}})["yieldToday"]
    add("freeze-in scattering closed form Y, m = 1e6 GeV, g = 106.75", Y, own, "spec section 7", "C", tol=1e-6)
    for q in (1, 2):
        Y = 45 * C.M_PL * (1e7) ** (2 * q - 1) / (2 * math.pi**2 * k166 * gg**1.5 * (2 * q - 1) * (1e13) ** (2 * q))
        own = R.abundance({"history": hist("thresholds", tmax=1e7), "candidate": {"mechanism": "freeze-in-ultraviolet", "massGeV": 1, "degreesOfFreedom": 1, "statistics": "boson", "ultraviolet": {"coefficient": 1, "scaleGeV": 1e13, "index": q}}})["yieldToday"]
        add("ultraviolet closed form Y, q = %d, g = 106.75" % q, Y, own, "EKW15", tol=1e-4)
    # unitarity: mass at which the s-wave bound (J=0) gives omegaH2 = target
    def unit(target, g, half, spec, seed):
        from scipy.optimize import brentq
        def F(l):
            m = math.exp(l)
            # <sv>_max = 4 pi/m^2 <1/v>, <1/v> = sqrt(x/pi): power law n = -1/2
            c = 4 * math.pi / m**2 / math.sqrt(math.pi) / C.CM3_PER_S
            return math.log(R.abundance({"history": spec, "candidate": fo(m, {"kind": "power-law", "coefficientCm3PerS": c, "exponent": -0.5}, g=g, sc=not half)})["omegaH2"] / target)
        return math.exp(brentq(F, math.log(seed / 5), math.log(seed * 5), xtol=1e-7))
    add("unitarity limit in GeV, omegaH2 = 0.12, self-conjugate g=2", 1e5, unit(0.12, 2, False, hist("thresholds"), 1e5), "spec section 10", note="published: of order 100 TeV", tol=1.0)
    add("unitarity limit in GeV, omegaH2 = 1, Dirac (g=4 both, half rate)", 3.4e5, unit(1.0, 4, True, hist("thresholds"), 3e5), "GK90", note="GK90's own approximations (x_f formula, g_*) differ", tol=0.2)
    sdb = []
    for b, nu in (("fit-2018", "specified"), ("fit-2018", "instantaneous"), ("lattice-2016", "specified"), ("ideal-switch", "instantaneous"), ("thresholds", "instantaneous")):
        row = {"bath": b, "neutrinos": nu, "omegaH2": 0.11, "sigmaVCm3PerS": {}}
        for m in (0.3, 1, 5, 10, 100, 1000):
            row["sigmaVCm3PerS"]["%g" % m] = needed_sigma(hist(b, nu), m, target=0.11)
        sdb.append(row); print(b, nu, row["sigmaVCm3PerS"], flush=True)
    s = sdb[1]["sigmaVCm3PerS"]
    add("SDB12 <sv> at m = 100 GeV, omegaH2 = 0.11 (fit-2018, s0 of N_eff = 3)", 2.2e-26, s["100"], "SDB12", tol=0.05)
    add("SDB12 <sv> at m = 0.3 GeV, omegaH2 = 0.11 (fit-2018, s0 of N_eff = 3)", 5.2e-26, s["0.3"], "SDB12", tol=0.05, note="newer bath")
    save("published.json", {"what": "published check values (the conventions, section 10) against this code", "checks": P, "sdb12": sdb}, folder)

if __name__ == "__main__":
    todo = sys.argv[1:] or ["species", "bath", "history", "rates", "abundance", "attribution", "inverse", "published"]
    for t in todo:
        if t == "abundance": run_cases(cases())
        elif t == "merge": merge_crosscheck()
        else: globals()[t]()
