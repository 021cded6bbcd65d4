"""
Reference values of heavy-quark masses, by formulas written independently of the program: re-expansion by repeated
differentiation, the potential averaged by quadrature, Borel integrals by quadrature along a rotated ray, R-evolution by
quadrature in ln R with a coupling from quadrature and root finding. Writes data/masses.json. mpmath 1.3.0, 40 digits.
"""
import json
import os
import mpmath as mp
from mpmath import mpf

mp.mp.dps = 50
PI = mp.pi
with mp.workdps(80):
    Z3, Z5 = mp.zeta(3), mp.zeta(5)
    L2, A4 = mp.log(2), mp.polylog(4, mpf(1) / 2)
    CF, CA = mpf(4) / 3, mpf(3)


def beta(nl):
    """beta_0 .. beta_3, alpha/(4 pi)."""
    return [
        11 - mpf(2) * nl / 3,
        102 - mpf(38) * nl / 3,
        mpf(2857) / 2 - mpf(5033) * nl / 18 + mpf(325) * nl**2 / 54,
        mpf(149753) / 6 + 3564 * Z3 - (mpf(1078361) / 162 + mpf(6508) * Z3 / 27) * nl
        + (mpf(50065) / 162 + mpf(6472) * Z3 / 81) * nl**2 + mpf(1093) * nl**3 / 729,
    ]


def pole(nl):
    """c_n of M/m(m) in alpha^(nl)/pi."""
    z2 = PI**2 / 6
    c2 = mpf(307) / 32 + 2 * z2 + 2 * z2 * L2 / 3 - Z3 / 6 - nl * (mpf(71) / 144 + z2 / 3)
    c3 = (mpf(8481925) / 93312 + mpf(652841) / 38880 * PI**2 - mpf(575) / 162 * PI**2 * L2 - mpf(22) / 81 * PI**2 * L2**2
          - mpf(695) / 7776 * PI**4 + mpf(58) / 27 * Z3 - mpf(1439) / 432 * PI**2 * Z3 + mpf(1975) / 216 * Z5
          - mpf(55) / 162 * L2**4 - mpf(220) / 27 * A4
          + nl * (-mpf(231847) / 23328 - mpf(991) / 648 * PI**2 - mpf(11) / 81 * PI**2 * L2 + mpf(2) / 81 * PI**2 * L2**2
                  + mpf(61) / 1944 * PI**4 - mpf(241) / 72 * Z3 + L2**4 / 81 + mpf(8) / 27 * A4)
          + nl**2 * (mpf(2353) / 23328 + mpf(13) / 324 * PI**2 + mpf(7) / 54 * Z3))
    n3 = mpf(42979) / 1119744 + mpf(317) / 2592 * Z3 + mpf(89) / 3888 * PI**2 + mpf(71) / 25920 * PI**4
    c4 = mpf('3567.60') - mpf('745.721') * nl + mpf('43.3962') * nl**2 - n3 * nl**3
    # alpha^(nl) = alpha^(nl+1) (1 + d2 a^2 + d3 a^3) at mu = m(m).
    d2 = mpf(11) / 72
    d3 = mpf(564731) / 124416 - mpf(82043) / 27648 * Z3 - mpf(2633) / 31104 * nl
    return [CF, c2, c3 - CF * d2, c4 - CF * d3 - 2 * c2 * d2]


def beta_r(al, b):
    """d alpha/d ln mu."""
    return -2 * al * sum(bk * (al / (4 * PI)) ** (k + 1) for k, bk in enumerate(b))


def run(al, ratio, b):
    if ratio == 1:
        return al
    guess = al / (1 + b[0] * al / (2 * PI) * mp.log(ratio))
    f = lambda a: mp.quad(lambda t: 1 / beta_r(t, b), [al, a]) - mp.log(ratio)
    return mp.findroot(f, guess, tol=mpf(10) ** -int(1.4 * mp.mp.dps))


def product(p, q, n):
    out = [mpf(0)] * (n + 1)
    for i, x in enumerate(p):
        for j, y in enumerate(q):
            if i + j <= n:
                out[i + j] += x * y
    return out


def reexpand(d, b, log, n):
    """Coefficients in alpha(mu) of sum d_k alpha(mu')^(k+1), log = ln(mu'/mu)."""
    cur = [mpf(0), mpf(1)] + [mpf(0)] * (n - 1)
    shift, factor = cur[:], mpf(1)
    for k in range(1, n + 1):
        nxt = [mpf(0)] * (n + 1)
        for m in range(1, n + 1):
            for j, bj in enumerate(b):
                if m + 1 + j <= n:
                    nxt[m + 1 + j] -= 2 * m * bj / (4 * PI) ** (j + 1) * cur[m]
        cur = nxt
        factor *= log / k
        shift = [s + c * factor for s, c in zip(shift, cur)]
    power, out = [mpf(1)] + [mpf(0)] * n, [mpf(0)] * (n + 1)
    for dk in d:
        power = product(power, shift, n)
        out = [o + dk * p for o, p in zip(out, power)]
    return out[1:]


def shape(nl):
    """b, c1, c2 (closed forms of Beneke 1995 and Pineda 2001), t."""
    b0, b1, b2, b3 = beta(nl)
    b = b1 / (2 * b0**2)
    c1 = (b1**2 / b0 - b2) / (4 * b * b0**3)
    c2 = (b1**4 + 4 * b0**3 * b1 * b2 - 2 * b0 * b1**2 * b2 + b0**2 * (-2 * b1**3 + b2**2) - 2 * b0**4 * b3) / (
        32 * b * (b - 1) * b0**8)
    return b, c1, c2, 2 * PI / b0


def asymptotic(nl, n):
    b, c1, c2, t = shape(nl)
    g = lambda k: mp.gamma(n + 1 + b - k) / mp.gamma(1 + b - k)
    return t**-n * (g(0) + c1 * g(1) + c2 * g(2))


def lateral(b, x):
    """int_0^inf e^(-x v) (1 - v)^(-1-b) dv above the axis, along v = e^(i phi) s."""
    w = mp.expj(mpf('0.7'))
    f = lambda s: mp.exp(-x * w * s) * (1 - w * s) ** (-1 - b) * w
    return mp.quad(f, [0, 0.25, 0.5, 1, 1.5, 2, 3, 5, 8, 13, 20, 40, 80])


def geometric(r, nl):
    """Coefficients in the coupling with beta = -b0 al^2/(1 - q al), and that coupling as a function of alpha."""
    A = [b / (4 * PI) ** (k + 1) for k, b in enumerate(beta(nl))]
    q, r2, r3 = A[1] / A[0], A[2] / A[0], A[3] / A[0]
    k3 = -(q**2 - r2)
    k4 = q * k3 - (-q**3 + 2 * q * r2 - r3) / 2
    out = [r[0], r[1], r[2] + k3 * r[0], r[3] + 2 * k3 * r[1] + k4 * r[0]]

    def coupling(al):
        rest = mp.quad(lambda x: (q * q - r2 + (q * r2 - r3) * x + q * r3 * x * x) / (1 + q * x + r2 * x * x + r3 * x**3), [0, al])
        return mp.findroot(lambda g: 1 / g + q * mp.log(g) - (1 / al + q * mp.log(al) - rest), al, tol=mpf(10) ** -80)

    return out, coupling, A


def potential(nl):
    """a1, a2, a3 of V(q), without the ultrasoft logarithm."""
    a1 = mpf(31) / 3 - mpf(10) * nl / 9
    a2 = (9 * (mpf(4343) / 162 + 4 * PI**2 - PI**4 / 4 + mpf(22) / 3 * Z3) - mpf(3) / 2 * (mpf(1798) / 81 + mpf(56) / 3 * Z3) * nl
          - mpf(2) / 3 * (mpf(55) / 3 - 16 * Z3) * nl + mpf(100) / 81 * nl**2)
    a3 = (mpf('502.24') * 27 - mpf('136.39') * 15 / 16
          + nl * (-mpf('709.717') * 9 / 2 + (-mpf(71281) / 162 + 264 * Z3 + 80 * Z5) * 2
                  + (mpf(286) / 9 + mpf(296) / 3 * Z3 - 160 * Z5) * 8 / 9 - mpf('56.83') * 5 / 96)
          + nl**2 * ((mpf(12541) / 243 + mpf(368) / 3 * Z3 + mpf(64) / 135 * PI**4) * 3 / 4 + (mpf(14002) / 81 - mpf(416) / 3 * Z3) / 3)
          - mpf(1000) / 729 * nl**3)
    return [1, a1, a2, a3]


def masses(nl, m, al, N, R, ratio):
    b4 = beta(nl)
    c = pole(nl)
    r = [c[n] / PI ** (n + 1) for n in range(4)]
    mu = ratio * m
    amu = run(al, ratio, b4)
    rmu = reexpand(r, b4, mp.log(m / mu), 4)
    pole_terms = [m * rmu[n] * amu ** (n + 1) for n in range(4)]
    out = {'alpha(mu)': amu, 'pole': pole_terms}

    def cut(d, scale):
        return [x * amu ** (n + 1) for n, x in enumerate(reexpand(d, b4, mp.log(scale / mu), 4))]

    asy = [N * R * asymptotic(nl, n) for n in range(4)]
    out['rs'] = cut(asy, R)
    out['rs-prime'] = cut([mpf(0)] + asy[1:], R)
    out['msr-practical fixed order'] = cut([R * x for x in r], R)
    # alpha_V(q) in alpha(R): coefficient polynomials in ln(q/R) by re-expansion, averaged by quadrature.
    v = [x / (4 * PI) ** n for n, x in enumerate(potential(nl))]
    avg = lambda n: mp.quad(lambda y: reexpand(v, b4, mp.log(y), 4)[n], [0, mpf(1) / 64, mpf(1) / 8, 1])
    own = [CF / PI * R * avg(n) for n in range(4)]
    own[3] += CF / PI * R * 2 * 8 * PI**2 * CA**3 / (4 * PI) ** 3
    out['ps'] = cut(own, R)
    # Kinetic, published form in alpha(m)/pi.
    b0 = b4[0]
    L = mp.log(2 * R / m)
    na = CA * (PI**2 / 6 - mpf(13) / 12)
    lb = [mpf(4) / 3 * CF * R / PI, mpf(4) / 3 * CF * R / PI**2 * ((mpf(4) / 3 - L / 2) * b0 - na)]
    mp2 = [CF * R**2 / PI, CF * R**2 / PI**2 * ((mpf(13) / 12 - L / 2) * b0 - na)]
    # 1/(2M) in alpha(m): (1 - r_0 alpha)/(2m).
    kin = [lb[0] + mp2[0] / (2 * m), lb[1] + (mp2[1] - mp2[0] * r[0]) / (2 * m)]
    out['kinetic'] = [x * amu ** (n + 1) for n, x in enumerate(reexpand(kin, b4, mp.log(m / mu), 2))]
    # Summed masses.
    b, c1, c2, t = shape(nl)
    x = t / amu
    pv = lambda e: lateral(e, x).real
    out['pv closed'] = N * mu * t * (pv(b) + c1 * pv(b - 1) + c2 * pv(b - 2))
    out['pv removed'] = [N * mu * asymptotic(nl, n) * amu ** (n + 1) for n in range(4)]
    rg, coupling, A = geometric(rmu, nl)
    ag = coupling(amu)
    xg = t / ag
    upto = mp.exp(-xg) * mp.hyp1f1(-b, 1 - b, xg) / -b
    out['mrs closed'] = N * mu * t * upto
    out['geometric pv closed'] = N * mu * t * lateral(b, xg).real
    out['Im'] = N * mu * t * abs(lateral(b, xg).imag)
    Rn = [N * (2 * A[0]) ** n * mp.gamma(n + 1 + b) / mp.gamma(1 + b) for n in range(4)]
    out['mrs terms'] = [(m * rg[n] - mu * Rn[n]) * ag ** (n + 1) for n in range(4)]
    return out


def evolved(nl, m, al, R, counts=(1, 2, 3, 4)):
    """m_MSRp(R) - m, with K terms of gamma and of beta."""
    b4 = beta(nl)
    c = pole(nl)
    a = [c[n] * 4 ** (n + 1) for n in range(4)]
    gamma = [a[n] - 2 * sum((n - j) * b4[j] * a[n - 1 - j] for j in range(n)) for n in range(4)]
    out = []
    for K in counts:
        bb = b4[:K]
        with mp.workdps(min(25, mp.mp.dps)):
            f = lambda lr: -m * mp.exp(lr) * sum(gamma[k] * (run(al, mp.exp(lr), bb) / (4 * PI)) ** (k + 1) for k in range(K))
            out.append(mp.quad(f, [0, mp.log(R / m)]))
    return out


def text(x, digits=36):
    if isinstance(x, list):
        return [text(y, digits) for y in x]
    if isinstance(x, dict):
        return {k: text(v, digits) for k, v in x.items()}
    return mp.nstr(x, digits)


CASES = [
    dict(name='bottom', light=4, mass='4.18', alpha='0.2250', strength='0.506186', cutoff='2', ratio='1'),
    dict(name='bottom, mu = 2 m', light=4, mass='4.18', alpha='0.2250', strength='0.506186', cutoff='2', ratio='2'),
    dict(name='top', light=5, mass='163', alpha='0.1085', strength='0.4641', cutoff='20', ratio='1'),
    dict(name='charm', light=3, mass='1.28', alpha='0.388837', strength='0.5357', cutoff='1', ratio='1.5'),
]

def main():
    result = {'generator': 'tests/outside/generate_masses.py, mpmath ' + mp.__version__ + ', 50 digits', 'cases': []}
    for case in CASES:
        values = masses(case['light'], *(mpf(case[k]) for k in ('mass', 'alpha', 'strength', 'cutoff', 'ratio')))
        result['cases'].append({**case, 'values': text(values)})
    result['evolved'] = {'light': 4, 'mass': '4.18', 'alpha': '0.2250', 'cutoff': '2',
                         'shifts': text(evolved(4, mpf('4.18'), mpf('0.2250'), mpf(2)), 20)}
    with open(os.path.join(os.path.dirname(os.path.abspath(__file__)), 'data', 'masses.json'), 'w') as f:
        json.dump(result, f, indent=1)


if __name__ == '__main__':
    main()
