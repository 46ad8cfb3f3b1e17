#!/usr/bin/env Rscript
# Values of R's distribution functions over a grid that reaches the tails, as a fixture for the tests.
# usage: Rscript scripts/peers/distributions.R > tests/stats/fixtures/distributions-r.json
# Base R only. Numbers are written with 17 significant digits, so that they are read back exactly.

P <- c(1e-12, 1e-9, 1e-6, 1e-4, 0.01, 0.05, 0.25, 0.4375, 0.5625, 0.75, 0.95, 0.99, 0.9999)
DF <- c(1, 1.5, 2, 3.7, 5, 10, 30, 100.5, 1000, 12345.6, 1e5)
PAIR <- c(1, 2.5, 7, 40, 300.25, 5000, 1e5)
SHAPE <- c(0.5, 1, 1.5, 4, 25.5, 700, 50000)
num <- function(x) sprintf("%.17g", x)
groups <- list()
# One group: name of our function, argument rows, values.
add <- function(name, args, values) {
  keep <- is.finite(values) & abs(values) > 1e-290
  args <- args[keep, , drop = FALSE]; values <- values[keep]
  rows <- apply(cbind(args, values), 1, function(r) paste0("[", paste(num(r), collapse = ","), "]"))
  groups[[length(groups) + 1]] <<- sprintf("  \"%s\": [\n   %s\n  ]", name, paste(rows, collapse = ",\n   "))
}
call <- function(f, a, ...) do.call(f, c(unname(as.list(as.data.frame(a))), list(...)))
# Quantiles at P from either side, then all functions of x at those places rounded to four digits.
family <- function(name, par, d, p, q, logs = TRUE, nonzero = FALSE) {
  grid <- as.matrix(merge(data.frame(p = P), par, by = NULL))
  lo <- call(q, grid); up <- call(q, grid, lower.tail = FALSE)
  add(paste0(name, "Quantile"), grid, lo)
  add(paste0(name, "UpperQuantile"), grid, up)
  at <- function(x) { a <- grid; a[, 1] <- signif(x, 4); unique(a) }
  L <- at(lo); U <- at(up)
  inside <- function(a) if (name == "beta") a[a[, 1] > 0 & a[, 1] < 1, , drop = FALSE] else a[is.finite(a[, 1]), , drop = FALSE]
  L <- inside(L); U <- inside(U)
  add(paste0(name, "Cdf"), L, call(p, L)); add(paste0(name, "Survival"), U, call(p, U, lower.tail = FALSE))
  D <- if (nonzero) L[L[, 1] != 0, , drop = FALSE] else L
  add(paste0(name, "Density"), D, call(d, D))
  if (logs) add(paste0(name, "LogSurvival"), U, call(p, U, lower.tail = FALSE, log.p = TRUE))
}
z <- c(-37, -20, -9.5, -6, -4, -3, -2.2, -1.5, -1.4, -0.7, -1e-3, -1e-9, 1e-9, 0.02, 0.5, 1, 1.49, 1.51, 2, 3.3, 5, 8, 12, 25, 37)
zm <- matrix(z, ncol = 1)
pn <- matrix(c(1e-300, 1e-100, 1e-30, P, 0.5 - 1e-9, 0.5 + 1e-9), ncol = 1)
add("normalCdf", zm, pnorm(z)); add("normalSurvival", zm, pnorm(z, lower.tail = FALSE)); add("normalDensity", zm, dnorm(z))
zl <- c(z, -100, 100, -1000); add("normalLogCdf", matrix(zl, ncol = 1), pnorm(zl, log.p = TRUE))
add("normalLogSurvival", matrix(zl, ncol = 1), pnorm(zl, lower.tail = FALSE, log.p = TRUE))
add("normalQuantile", pn, qnorm(pn[, 1])); add("normalUpperQuantile", pn, -qnorm(pn[, 1]))  # with lower.tail = FALSE R loses digits near 1/2
family("studentT", data.frame(df = DF), dt, pt, qt)
family("chiSquare", data.frame(df = DF), dchisq, pchisq, qchisq)
# R's qf forms 1 / x - 1 with x near 1 and loses up to all digits of small quantiles; the same value from qbeta keeps them.
odds <- function(p, a, b, lower.tail = TRUE) {
  x <- qbeta(p, a / 2, b / 2, lower.tail = lower.tail); y <- qbeta(p, b / 2, a / 2, lower.tail = !lower.tail)
  ifelse(x < 0.5, x / (1 - x), (1 - y) / y) * b / a
}
family("f", merge(data.frame(a = PAIR), data.frame(b = PAIR), by = NULL), df, pf, odds)
family("beta", merge(data.frame(a = SHAPE), data.frame(b = SHAPE), by = NULL), dbeta, pbeta, qbeta)
b <- merge(data.frame(n = c(1, 7, 60, 1000, 1e5)), data.frame(s = c(1e-6, 0.01, 0.3, 0.5, 0.97)), by = NULL)
g <- as.matrix(merge(data.frame(p = P), b, by = NULL))
add("binomialQuantile", g, call(qbinom, g))
k <- g; k[, 1] <- pmin(k[, 2], call(qbinom, g)); k <- unique(k)
add("binomialMass", k, call(dbinom, k)); add("binomialCdf", k, call(pbinom, k)); add("binomialSurvival", k, call(pbinom, k, lower.tail = FALSE))
cat(sprintf("{\n \"source\": \"base R distribution functions\",\n \"program\": \"R %s.%s\",\n \"script\": \"scripts/peers/distributions.R\",\n \"madeOn\": \"%s\",\n \"rows\": \"arguments, then the value\",\n \"groups\": {\n%s\n }\n}\n",
  R.version$major, R.version$minor, Sys.Date(), paste(unlist(groups), collapse = ",\n")))
