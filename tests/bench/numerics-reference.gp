\\ Costs of PARI/GP for tests/bench/numerics.mjs, which sets DIGITS, ORDERS, COEFFICIENTS, X, PIPELINE_DIGITS before it reads
\\ this file. Lines "operation digits name microseconds value" and "pipeline order milliseconds re im". The least batch counts.
\\ Mean CPU time of n calls, in microseconds.
batch(f, xs, ys, s, n) = { gettime(); for (i = 1, n, f(xs[i % 8 + 1], ys[i % 8 + 1], s)); 1000. * gettime() / n };
least(f, xs, ys, s) = {
  my(n = 1, best, t);
  f(xs[1], ys[1], s);
  until (t * n / 1000 >= 25 || n >= 400000, n *= 2; t = batch(f, xs, ys, s, n));
  best = t;
  for (k = 1, 4, best = min(best, batch(f, xs, ys, s, n)));
  best
};
operation(d, name, f) = {
  my(xs = vector(8, i, sqrt(2) * (3 + (i - 1) / 7)), ys = vector(8, i, sqrt(3) * (1 + (i - 1) / 11)), s = -sqrt(5) / 7);
  printf("operation %d %s %.6f %.15g\n", d, name, least(f, xs, ys, s), f(xs[1], ys[1], s));
};
operations(d) = {
  localprec(d);
  operation(d, "multiply", (x, y, s) -> x * y);
  operation(d, "divide", (x, y, s) -> x / y);
  operation(d, "exp", (x, y, s) -> exp(y));
  operation(d, "log", (x, y, s) -> log(x));
  operation(d, "atan", (x, y, s) -> atan(x));
  operation(d, "gamma", (x, y, s) -> gamma(x));
  operation(d, "e1", (x, y, s) -> eint1(x));
  operation(d, "incomplete-gamma", (x, y, s) -> incgam(s, x));
};
\\ [n/n] by a linear solve in reals, polroots, residues, closed form (as in numerics-reference.py).
pipeline(n) = {
  my(b, m, q, p, roots, slope, total, r, w);
  localprec(PIPELINE_DIGITS + 5 * n + 20);
  b = COEFFICIENTS * 1.;
  m = matrix(n, n, i, j, b[n + i - j + 1]);
  q = concat([1.], matsolve(m, -vectorv(n, i, b[n + i + 1]))~);
  p = vector(n + 1, k, sum(j = 1, k, q[j] * b[k - j + 1]));
  q = Pol(Vecrev(q)); p = Pol(Vecrev(p));
  roots = polroots(q);
  slope = deriv(q);
  total = polcoef(p, n) / polcoef(q, n);
  for (k = 1, n,
    r = subst(p, x, roots[k]) / subst(slope, x, roots[k]);
    localprec(PIPELINE_DIGITS + 15);
    w = -roots[k] * 1. / X;
    if (imag(roots[k]) == 0 && real(roots[k]) > 0,
      r = real(r); w = real(w);
      total -= r / X * exp(w) * (Pi * I - real(eint1(w)))
    ,
      total += r / X * exp(w) * if (imag(w) == 0, eint1(real(w)), incgam(0, w))));
  total
};
timed(n) = {
  my(best = 10^9, v);
  for (k = 1, if (n <= 20, 5, 2), gettime(); v = pipeline(n); best = min(best, gettime()));
  localprec(120);
  printf("pipeline %d %d %.110g %.110g\n", n, best, real(v), imag(v));
};
foreach (DIGITS, d, operations(d));
foreach (ORDERS, n, timed(n));
quit
