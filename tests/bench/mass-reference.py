"""Mass conversions with mpmath, timed; one JSON object on standard output. The formulas are those of the reference values."""
import json
import os
import sys
import time

import mpmath as mp
from mpmath import mpf

sys.path.insert(0, os.path.join(os.path.dirname(os.path.abspath(__file__)), '..', 'outside'))
import generate_masses as g

task = json.load(sys.stdin)
NL, N = task['light'], mpf(task['strength'])
ALPHA, AT, CUT = mpf(task['alpha']), mpf(task['at']), mpf(task['cutoff'])


def rs(m, c, beta, asy):
    """m_RS at fixed order at mu = m, the coupling run from AT."""
    al = g.run(ALPHA, m / AT, beta)
    removed = g.reexpand(asy, beta, mp.log(CUT / m), 4)
    return m + sum((m * c[n] / mp.pi ** (n + 1) - removed[n]) * al ** (n + 1) for n in range(4))


def timed(run):
    start = time.process_time()
    value = run()
    return value, time.process_time() - start


mp.mp.dps = 17
beta, c = g.beta(NL), g.pole(NL)
asy = [N * CUT * g.asymptotic(NL, n) for n in range(4)]
forward, t_forward = timed(lambda: [rs(mpf(m), c, beta, asy) for m in task['masses']])
inverse, t_inverse = timed(
    lambda: [mp.findroot(lambda m: rs(m, c, beta, asy) - mpf(x), mpf(x) * mpf('0.95')) for x in task['inverse']])
m0 = mpf(task['masses'][0])


def evolve():
    """The evolution over ln R with Gauss-Legendre nodes, the coupling run to each."""
    a = [c[n] * 4 ** (n + 1) for n in range(4)]
    gamma = [a[n] - 2 * sum((n - j) * beta[j] * a[n - 1 - j] for j in range(n)) for n in range(4)]
    start = g.run(ALPHA, m0 / AT, beta)

    def slope(lr):
        x = g.run(start, mp.exp(lr), beta) / (4 * mp.pi)
        return -m0 * mp.exp(lr) * sum(gk * x ** (k + 1) for k, gk in enumerate(gamma))

    return mp.quad(slope, [0, mp.log(CUT / m0)], method='gauss-legendre', maxdegree=3)


evolved, t_evolved = timed(evolve)

mp.mp.dps = 60
m0, ALPHA, AT, N = (mpf(x) for x in (task['masses'][0], task['alpha'], task['at'], task['strength']))


def pv():
    al = g.run(ALPHA, m0 / AT, g.beta(NL))
    b, c1, c2, t = g.shape(NL)
    x, c50 = t / al, g.pole(NL)
    part = lambda e: g.lateral(e, x).real
    closed = N * m0 * t * (part(b) + c1 * part(b - 1) + c2 * part(b - 2))
    return m0 + closed + sum(
        m0 * (c50[n] / mp.pi ** (n + 1) - N * g.asymptotic(NL, n)) * al ** (n + 1) for n in range(4))


value, t_pv = timed(pv)
print(json.dumps({
    'version': mp.__version__,
    'forward': [mp.nstr(x, 17) for x in forward], 'forwardTime': t_forward / len(forward),
    'inverse': [mp.nstr(x, 17) for x in inverse], 'inverseTime': t_inverse / len(inverse),
    'evolved': mp.nstr(evolved, 17), 'evolvedTime': t_evolved,
    'pv': mp.nstr(value, 55), 'pvTime': t_pv,
}))
