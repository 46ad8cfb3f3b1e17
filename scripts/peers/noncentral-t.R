#!/usr/bin/env Rscript
# Noncentral t probabilities by adaptive integration over the chi density, as a fixture for the tests. R's own pt keeps
# no digits of small tails with a noncentrality (its series adds terms of both signs), so it serves as a check here only.
# usage: Rscript scripts/peers/noncentral-t.R > tests/stats/fixtures/noncentral-t-r.json
num <- function(x) sprintf("%.17g", x)
tail <- function(x, df, ncp, lower) {
  f <- function(w) pnorm(x * w - ncp, lower.tail = lower) * 2 * df * w * dchisq(df * w^2, df)
  # Break where the product is largest, so that the adaptive rule cannot miss it.
  g <- seq(1e-4, 6, length.out = 60001); v <- f(g); m <- g[which.max(v)]
  w <- g[v >= max(v) * 1e-16]; cut <- sort(unique(c(0, pmax(0, m + (max(w) - min(w)) * c(-1, -0.5, -0.25, -0.1, 0, 0.1, 0.25, 0.5, 1)))))
  sum(sapply(seq_along(cut[-1]), function(i) integrate(f, cut[i], cut[i + 1], rel.tol = 1e-13, abs.tol = 0, subdivisions = 2000, stop.on.error = FALSE)$value))
}
rows <- c()
for (df in c(1, 2.5, 5, 19, 80, 400)) for (ncp in c(-2, 0, 0.7, 3, 12)) for (q in c(1e-8, 1e-3, 0.2, 0.5, 0.9, 0.9999)) {
  x <- suppressWarnings(signif(qt(q, df, ncp), 4)); if (!is.finite(x)) next
  lo <- tail(x, df, ncp, TRUE); up <- tail(x, df, ncp, FALSE)
  if (abs(lo + up - 1) > 1e-12 || abs(lo - suppressWarnings(pt(x, df, ncp))) > 1e-9) next
  rows <- c(rows, paste0("[", paste(num(c(x, df, ncp, lo, up)), collapse = ", "), "]"))
}
cat(sprintf("{\n \"source\": \"adaptive integration of the definition\",\n \"program\": \"R %s.%s, integrate\",\n \"script\": \"scripts/peers/noncentral-t.R\",\n \"madeOn\": \"%s\",\n \"rows\": \"x, df, ncp, cdf, survival\",\n \"values\": [\n  %s\n ]\n}\n",
  R.version$major, R.version$minor, Sys.Date(), paste(rows, collapse = ",\n  ")))
