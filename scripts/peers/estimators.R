#!/usr/bin/env Rscript
# Robust estimates of data sets that come in on standard input, one a line: name;value,value,...
# Prints one line a data set: name;estimate=value;... for estimators.mjs. Needs MASS and robustbase.
suppressPackageStartupMessages({library(MASS); library(robustbase)})
num <- function(x) sprintf("%.17g", x)

# Huber's proposal 2 as MASS::hubers iterates it, which itself stops after 30 rounds.
proposal2 <- function(y, k) {
  th <- 2 * pnorm(k) - 1; beta <- th + k^2 * (1 - th) - 2 * k * dnorm(k)
  m <- median(y); s <- mad(y); if (s == 0) return(c(NA, NA))
  for (i in 1:200000) {
    w <- pmin(pmax(m - k * s, y), m + k * s); m1 <- mean(w); s1 <- sqrt(sum((w - m1)^2) / (length(y) - 1) / beta)
    done <- abs(m - m1) + abs(s - s1) < 1e-15 * s1; m <- m1; s <- s1; if (done) break
  }
  c(m, s)
}
# Q method by its definition, all differences written down; equal as decimals to ten places of the largest.
qmethod <- function(x) {
  d <- as.vector(dist(x)); d <- signif(d, 15); tol <- 1e-12 * max(abs(x)); d[d <= tol] <- 0
  u <- sort(d); last <- c(diff(u) > tol, TRUE); X <- u[last]; H <- which(last) / length(u)
  if (length(X) == 1 && X == 0) return(0)
  H0 <- if (X[1] == 0) H[1] else 0
  if (X[1] != 0) { X <- c(0, X); H <- c(0, H) }
  G <- c(0, (H[-1] + H[-length(H)]) / 2); t <- 0.25 + 0.75 * H0; k <- which(G >= t)[1]
  (X[k - 1] + (t - G[k - 1]) / (G[k] - G[k - 1]) * (X[k] - X[k - 1])) / (sqrt(2) * qnorm(0.625 + 0.375 * H0))
}
algs <- function(w, nu) {
  e <- sqrt(qchisq(.9, nu) / nu); xi <- 1 / sqrt(pchisq(nu * e^2, nu + 2) + 0.1 * e^2); s <- median(w)
  if (s == 0) return(NA)
  for (i in 1:100000) { n <- xi * sqrt(mean(pmin(w, e * s)^2)); if (abs(n - s) < 1e-16 * s) break; s <- n }
  s
}
# robustbase::Qn rounds to single precision on its way (off by up to 5e-8, 0 for values near 1e-140, infinite near 1e140), so the order
# statistic is also taken from all differences.
qndef <- function(x) {
  n <- length(x); h <- n %/% 2 + 1
  small <- c(0.399356, 0.99365, 0.51321, 0.84401, 0.6122, 0.85877, 0.66993, 0.87344, 0.72014, 0.88906, 0.75743)
  f <- if (n <= 12) small[n - 1] else 1 / robustbase:::Qn.finite.c(n)
  2.21914 * f * sort(dist(x))[choose(h, 2)]
}
for (line in readLines(file("stdin"))) {
  parts <- strsplit(line, ";")[[1]]; x <- as.numeric(strsplit(parts[2], ",")[[1]])
  p15 <- proposal2(x, 1.5); p1 <- proposal2(x, 1)
  d <- qndef(x); q <- Qn(x); r <- c(qnRobustbase = if (!is.finite(q) || (q == 0 && d > 0)) NA else q, qn = d, sn = Sn(x), huberLocation = huber(x, tol = 1e-14)$mu, proposal2Location = p15[1], proposal2Scale = p15[2],
    proposal1Location = p1[1], proposal1Scale = p1[2], trimmed = mean(x, trim = 0.1), qMethod = qmethod(x), algorithmS = algs(abs(x), 3),
    hingeLow = fivenum(x)[2], hingeHigh = fivenum(x)[4])
  cat(parts[1], paste(names(r), num(r), sep = "=", collapse = ";"), sep = ";"); cat("\n")
}
cat(sprintf("#R %s.%s, MASS %s, robustbase %s\n", R.version$major, R.version$minor, packageVersion("MASS"), packageVersion("robustbase")))
