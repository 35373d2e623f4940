"""Random words, Latin hypercube columns, normal quantiles and statistics, for sampling.json:  python3 sampling.py

Nothing here shares code with the core. The generator of random words is written for any word size; with 64 bits it must give what
numpy's Philox gives, and with 32 bits the known answers of Salmon et al. (SC11, 2011), before it writes anything."""
import hashlib, json, os, sys
import numpy as np, scipy, mpmath as mp
from scipy import stats

HERE = os.path.dirname(os.path.dirname(os.path.abspath(__file__)))
VERSIONS = {"python": sys.version.split()[0], "numpy": np.__version__, "scipy": scipy.__version__, "mpmath": mp.__version__}

CONSTANTS = {32: (0xD2511F53, 0xCD9E8D57, 0x9E3779B9, 0xBB67AE85),
             64: (0xD2E7470EE14C6C93, 0xCA5A826395121157, 0x9E3779B97F4A7C15, 0xBB67AE8584CAA73B)}

def philox(counter, key, bits=32):
    m0, m1, w0, w1 = CONSTANTS[bits]; mask = (1 << bits) - 1
    c, k = list(counter), list(key)
    for _ in range(10):
        p0, p1 = m0 * c[0], m1 * c[2]
        c = [(p1 >> bits) ^ c[1] ^ k[0], p1 & mask, (p0 >> bits) ^ c[3] ^ k[1], p0 & mask]
        k = [(k[0] + w0) & mask, (k[1] + w1) & mask]
    return c

def against_numpy():
    for counter, key in (([0, 0, 0, 0], [0, 0]), ([5, 6, 7, 8], [123456789, 987654321])):
        bit = np.random.Philox(counter=counter, key=key)  # numpy counts up before its first block
        assert [int(v) for v in bit.random_raw(4)] == philox([counter[0] + 1] + counter[1:], key, 64)

# Known answers, from memory of the authors' test vectors.
KNOWN = [([0] * 4, [0] * 2, [0x6627E8D5, 0xE169C58D, 0xBC57AC4C, 0x9B00DBD8]),
         ([0xFFFFFFFF] * 4, [0xFFFFFFFF] * 2, [0x408F276D, 0x41C83B0E, 0xA20BC7C6, 0x6D5451FD]),
         ([0x243F6A88, 0x85A308D3, 0x13198A2E, 0x03707344], [0xA4093822, 0x299F31D0], [0xD16CFE09, 0x94FDCCEB, 0x5001E420, 0x24126EA1])]

class Stream:
    """Words of the key from SHA-256 of a name, the seed in the upper half of the counter."""
    def __init__(self, name, seed):
        d = hashlib.sha256(name.encode()).digest()
        self.key = [int.from_bytes(d[:4], "big"), int.from_bytes(d[4:8], "big")]; self.seed = seed; self.block = 0; self.held = []
    def word(self):
        if not self.held:
            n = self.block; self.block += 1
            self.held = philox([n & 0xFFFFFFFF, n >> 32, self.seed & 0xFFFFFFFF, self.seed >> 32], self.key)
        return self.held.pop(0)
    def below(self, n):
        while True:
            w = self.word()
            if w < (1 << 32) // n * n: return w % n

def column(name, samples, seed):
    s = Stream(name, seed); strata = list(range(samples))
    for last in range(samples - 1, 0, -1):
        other = s.below(last + 1); strata[last], strata[other] = strata[other], strata[last]
    return [(k + (s.word() + 0.5) / 2**32) / samples for k in strata]

def normal_quantiles():
    ps = [1e-300, 1e-100, 1e-30, 1e-16, 1e-12, 1e-11, 1.3887943864964021e-11, 1e-9, 1e-6, 1e-3, 0.01, 0.025, 0.05, 0.074, 0.075, 0.076, 0.1, 0.16, 0.25, 0.4, 0.49,
          0.4999999, 0.5, 0.5000001, 0.6, 0.75, 0.84, 0.9, 0.925, 0.95, 0.975, 0.999, 1 - 1e-6, 1 - 1e-12, 1 - 2.0**-52]
    out = []
    with mp.workdps(400):
        for p in ps:
            x = mp.mpf(float(stats.norm.ppf(p)))
            for _ in range(12):  # Newton on the distribution function
                x -= (mp.ncdf(x) - mp.mpf(p)) / mp.npdf(x)
            out.append({"p": p, "quantile": float(x), "scipy": float(stats.norm.ppf(p))})
    return out

def two_piece(value, minus, plus, p):
    """By solving for the quantile of the density integrated numerically, not by its closed form."""
    mode, lo, hi = mp.mpf(value), mp.mpf(minus), mp.mpf(plus)
    below = lambda x: mp.quad(lambda t: mp.exp(-((t - mode) / (lo if t < mode else hi))**2 / 2), [mode - 12 * lo, mode, x] if x > mode else [mode - 12 * lo, x])
    whole = below(mode + 12 * hi)
    a, b = mode - 9 * lo, mode + 9 * hi
    for _ in range(70):
        m = (a + b) / 2
        if below(m) / whole < p: a = m
        else: b = m
    return float((a + b) / 2)

def statistics():
    rng = np.random.default_rng(20261201)
    v = np.round(np.exp(rng.normal(-2, 1.5, 101)), 3); w = np.round(0.3 * np.log(v) + rng.normal(0, 0.5, 101), 1)  # rounded, so that there are ties
    qs = [0, 0.025, 0.16, 0.5, 0.84, 0.975, 1]
    return {"values": v.tolist(), "others": w.tolist(), "quantiles": [{"probability": q, "value": float(np.quantile(v, q, method="linear"))} for q in qs],
            "mean": float(np.mean(v)), "standardDeviation": float(np.std(v, ddof=1)), "rankCorrelation": float(stats.spearmanr(v, w).correlation),
            "ranks": stats.rankdata(v).tolist()}

def main():
    against_numpy()
    for c, k, out in KNOWN: assert philox(c, k) == out
    cols = [("candidate.massGeV", 12, 1), ("candidate.massGeV", 12, 2), ("history.bath.band", 12, 1), ("candidate.parent.lifetimeS", 7, 2**53 - 1)]
    data = {"madeWith": VERSIONS,
            "what": "Philox4x32-10 words by counter and key; Latin hypercube columns by name, number of samples and seed; quantiles of the normal and the two-piece normal distribution; quantiles, moments, ranks and rank correlation of a set of values",
            "precision": "words and columns exact; normal quantiles correctly rounded (mpmath, 400 digits), SciPy's beside them; two-piece normal 1e-12; statistics as numpy and SciPy give them",
            "philox": [{"counter": c, "key": k, "words": philox(c, k)} for c, k, _ in KNOWN] + [{"counter": [1, 0, 7, 0], "key": [3, 4], "words": philox([1, 0, 7, 0], [3, 4])}],
            "columns": [{"name": n, "samples": s, "seed": d, "values": column(n, s, d)} for n, s, d in cols],
            "normalQuantiles": normal_quantiles(),
            "twoPieceNormal": [{"value": v, "minus": a, "plus": b, "probability": p, "quantile": two_piece(v, a, b, p)}
                               for v, a, b in ((300, 20, 50), (1e-3, 2e-4, 1e-4)) for p in (0.025, 0.16, 0.3, 0.5, 0.84, 0.975)],
            "statistics": statistics()}
    with open(os.path.join(HERE, "sampling.json"), "w") as f: json.dump(data, f, indent=1, allow_nan=False); f.write("\n")

if __name__ == "__main__": main()
