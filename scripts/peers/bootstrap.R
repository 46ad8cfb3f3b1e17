#!/usr/bin/env Rscript
# Bootstrap and BCa by their formulas, with uniform numbers from a small generator that the tests have too, and censored
# normal likelihoods maximised by nlminb; as a fixture for the tests. Base R only.
# usage: Rscript scripts/peers/bootstrap.R > tests/stats/fixtures/bootstrap-r.json
num <- function(x) sprintf("%.17g", x)
list2 <- function(x) paste0("[", paste(num(x), collapse = ", "), "]")
state <- 42; uniform <- function() { state <<- (16807 * state) %% 2147483647; state / 2147483647 }  # Park and Miller 1988
x <- c(12.1, 9.8, 10.4, 11.3, 10.9, 15.2, 10.1, 11.8, 10.6, 13.9, 9.1, 10.7)
f <- list(mean = mean, median = median, sd = sd)
boot <- c()
for (name in names(f)) {
  state <- 42; R <- 999; e <- f[[name]]
  t <- sort(sapply(1:R, function(r) e(x[1 + floor(sapply(seq_along(x), function(i) uniform()) * length(x))])))
  t0 <- e(x); z0 <- qnorm((sum(t < t0) + sum(t == t0) / 2) / R)
  j <- sapply(seq_along(x), function(i) e(x[-i])); d <- mean(j) - j; a <- sum(d^3) / (6 * sum(d^2)^1.5)
  z <- qnorm(c(0.025, 0.975)); p <- pnorm(z0 + (z0 + z) / (1 - a * (z0 + z)))
  boot <- c(boot, sprintf("{\"estimator\": \"%s\", \"standardError\": %s, \"percentile\": %s, \"bca\": %s, \"biasCorrection\": %s, \"acceleration\": %s}",
    name, num(sd(t)), list2(quantile(t, c(0.025, 0.975), names = FALSE)), list2(quantile(t, p, names = FALSE)), num(z0), num(a)))
}
state <- 7; cens <- c()
for (case in 1:8) {
  n <- c(8, 8, 12, 12, 30, 30, 60, 5)[case]; v <- round(qnorm(sapply(1:n, function(i) uniform())) * 2 + 10, 2)
  lo <- c(9, 8.5, NA, 10, 9, NA, 10.5, 9)[case]; hi <- c(NA, 12, 11, NA, 12, 10.5, NA, 11.5)[case]
  left <- if (is.na(lo)) numeric(0) else rep(lo, sum(v < lo)); right <- if (is.na(hi)) numeric(0) else rep(hi, sum(v > hi))
  w <- v[(is.na(lo) | v >= lo) & (is.na(hi) | v <= hi)]
  if (length(unique(w)) < 2) next
  l <- function(q) -(sum(dnorm(w, q[1], exp(q[2]), log = TRUE)) + sum(pnorm(left, q[1], exp(q[2]), log.p = TRUE)) + sum(pnorm(right, q[1], exp(q[2]), lower.tail = FALSE, log.p = TRUE)))
  o <- nlminb(c(mean(w), log(sd(w))), l, control = list(rel.tol = 1e-15, x.tol = 1e-14, iter.max = 1000, eval.max = 2000))
  H <- optimHess(o$par, l, control = list(ndeps = c(1e-4, 1e-4))); se <- sqrt(diag(solve(H)))
  cens <- c(cens, sprintf("{\"values\": %s, \"lessThan\": %s, \"greaterThan\": %s, \"location\": %s, \"scale\": %s, \"logLikelihood\": %s, \"locationStandardError\": %s, \"scaleStandardError\": %s}",
    list2(w), if (length(left)) list2(left) else "[]", if (length(right)) list2(right) else "[]", num(o$par[1]), num(exp(o$par[2])), num(-o$objective), num(se[1]), num(se[2] * exp(o$par[2]))))
}
ranges <- sapply(c(3, 4, 5, 10, 25), function(n) {
  m2 <- integrate(function(w) 2 * w * ptukey(w, n, Inf, lower.tail = FALSE), 0, 20, rel.tol = 1e-11)$value
  c0 <- qtukey(0.9, n, Inf); t2 <- integrate(function(w) 2 * w * ptukey(w, n, Inf, lower.tail = FALSE), 0, c0, rel.tol = 1e-11)$value
  sprintf("{\"rangeOf\": %d, \"eta\": %s, \"xi\": %s, \"toSd\": %s}", n, num(c0 / sqrt(m2)), num(sqrt(m2 / t2)), num(sqrt(m2)))
})
cat(sprintf("{\n \"source\": \"formulas in base R\",\n \"program\": \"R %s.%s\",\n \"script\": \"scripts/peers/bootstrap.R\",\n \"madeOn\": \"%s\",\n \"values\": %s,\n \"seed\": 42,\n \"resamples\": 999,\n \"bootstrap\": [\n  %s\n ],\n \"censored\": [\n  %s\n ],\n \"ranges\": [\n  %s\n ]\n}\n",
  R.version$major, R.version$minor, Sys.Date(), list2(x), paste(boot, collapse = ",\n  "), paste(cens, collapse = ",\n  "), paste(ranges, collapse = ",\n  ")))
