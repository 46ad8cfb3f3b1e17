#!/usr/bin/env Rscript
# Regression, agreement, decisions and planning from base R, as a fixture for the tests.
# usage: Rscript scripts/peers/method-comparison.R > tests/stats/fixtures/method-comparison-r.json
# Base R only. Numbers are written with 17 significant digits, so that they are read back exactly.

set.seed(20261201)
num <- function(x) ifelse(is.finite(x), sprintf("%.17g", x), "null")
vec <- function(x) paste0("[", paste(num(x), collapse = ","), "]")
obj <- function(...) { a <- c(...); paste0("{", paste(sprintf("\"%s\":%s", names(a), a), collapse = ","), "}") }
list_of <- function(x) paste0("[\n  ", paste(x, collapse = ",\n  "), "\n ]")

line <- function(n, scale) {
  x <- round(runif(n, 1, 50), 2) * scale; y <- 1.5 * scale + 0.9 * x + rnorm(n, 0, 2) * scale; w <- runif(n, 0.2, 3)
  f <- lm(y ~ x); g <- lm(y ~ x, weights = w); o <- lm(y ~ 0 + x); q <- lm(y ~ x + I(x^2))
  at <- data.frame(x = 20 * scale)
  p <- predict(f, at, interval = "prediction"); m <- predict(f, at, interval = "confidence")
  s <- summary(f); sg <- summary(g)
  # Orthogonal regression as the first principal axis: another road to Deming with ratio 1.
  v <- prcomp(cbind(x, y))$rotation[, 1]; b <- unname(v[2] / v[1])
  d <- y - x; t <- t.test(y, x, paired = TRUE); r <- cor.test(x, y)
  k <- function(p) qt(p, n - 1, 1.96 * sqrt(n)) / sqrt(n)
  obj(x = vec(x), y = vec(y), w = vec(w),
      ols = vec(c(coef(s)[, 1:2], s$sigma, s$r.squared, vcov(f)[1, 2])), interval = vec(confint(f)),
      predict = vec(c(m, p[2:3])), wls = vec(c(coef(sg)[, 1:2], sg$sigma, sg$r.squared)),
      origin = vec(c(coef(summary(o))[1, 1:2], summary(o)$sigma, summary(o)$r.squared)),
      quadratic = vec(coef(summary(q))[, 1:2]),
      orthogonal = vec(c(b, mean(y) - b * mean(x))),
      paired = vec(c(t$estimate, t$statistic, t$p.value, t$conf.int)),
      pearson = vec(c(r$estimate, r$p.value, if (is.null(r$conf.int)) c(NA, NA) else r$conf.int)),
      exactLimits = vec(mean(d) + sd(d) * c(-k(0.975), -k(0.025), k(0.025), k(0.975))))
}
lines <- c()
for (n in c(4, 7, 20, 150)) for (scale in c(1, 1e-6, 1e8)) lines <- c(lines, line(n, scale))

tau <- function(n) { x <- sample(n); y <- sample(n); k <- cor.test(x, y, method = "kendall", exact = TRUE)
  obj(x = vec(x), y = vec(y), value = vec(c(k$estimate, k$p.value))) }
tauTies <- function(n) { x <- round(runif(n) * 4); y <- round(runif(n) * 6)
  k <- suppressWarnings(cor.test(x, y, method = "kendall", exact = FALSE))
  obj(x = vec(x), y = vec(y), value = vec(c(k$estimate, k$p.value))) }
mcnemar <- function(b, c) { m <- matrix(c(9, c, b, 8), 2)
  obj(b = num(b), c = num(c), value = vec(c(mcnemar.test(m, correct = FALSE)$statistic, mcnemar.test(m)$statistic,
    mcnemar.test(m, correct = FALSE)$p.value, mcnemar.test(m)$p.value, binom.test(b, b + c)$p.value))) }
# Kappa by the delta method on the multinomial shares, with a numerical gradient.
kappa_of <- function(p) { po <- p[1] + p[4]; r <- p[1] + p[2]; s <- p[1] + p[3]; pe <- r * s + (1 - r) * (1 - s); (po - pe) / (1 - pe) }
kappa <- function(t) { n <- sum(t); p <- t / n; h <- 1e-5
  g <- sapply(1:4, function(i) { e <- rep(0, 4); e[i] <- h
    (8 * (kappa_of(p + e) - kappa_of(p - e)) - (kappa_of(p + 2 * e) - kappa_of(p - 2 * e))) / (12 * h) })
  v <- (sum(p * g^2) - sum(p * g)^2) / n
  obj(table = vec(t), value = vec(c(kappa_of(p), sqrt(v)))) }
proportion <- function(x, n, conf) obj(x = num(x), n = num(n), confidence = num(conf),
  value = vec(c(prop.test(x, n, conf.level = conf, correct = FALSE)$conf.int, binom.test(x, n, conf.level = conf)$conf.int)))
tpower <- function(n, d, s, a) obj(count = num(n), difference = num(d), sd = num(s), alpha = num(a),
  value = num(power.t.test(n, d, s, a, type = "paired", strict = TRUE)$power))
tost <- function(n, s, m, d, a) { df <- n - 1; t <- qt(1 - a, df); u <- s / sqrt(n)
  f <- function(w) pmax(0, pnorm((m - d) / u - t * w) - pnorm((-m - d) / u + t * w)) * 2 * df * w * dchisq(df * w^2, df)
  top <- m / u / t
  value <- integrate(f, 0, min(top, 1 + 12 / sqrt(2 * df)), rel.tol = 1e-11, abs.tol = 1e-14, subdivisions = 2000)$value
  obj(count = num(n), sd = num(s), margin = num(m), difference = num(d), alpha = num(a), value = num(value)) }

cat("{\n \"source\": \"base R: lm, predict, prcomp, t.test, cor.test, qt, mcnemar.test, binom.test, prop.test, power.t.test, integrate\",\n")
cat(sprintf(" \"program\": \"R %s.%s\",\n \"script\": \"scripts/peers/method-comparison.R\",\n \"madeOn\": \"2026-12-01\",\n", R.version$major, R.version$minor))
cat(" \"lines\":", list_of(lines), ",\n")
cat(" \"kendallExact\":", list_of(sapply(c(2, 3, 5, 9, 20, 49), tau)), ",\n")
cat(" \"kendallTies\":", list_of(sapply(c(6, 15, 80), tauTies)), ",\n")
cat(" \"mcNemar\":", list_of(mapply(mcnemar, c(2, 10, 5, 1, 40), c(10, 2, 5, 0, 60))), ",\n")
cat(" \"kappa\":", list_of(sapply(list(c(20, 5, 10, 15), c(90, 3, 1, 6), c(2, 30, 40, 3), c(50, 20, 1, 1)), kappa)), ",\n")
cat(" \"proportions\":", list_of(mapply(proportion, c(0, 1, 7, 50, 999), c(8, 8, 20, 50, 1000), c(0.95, 0.9, 0.99, 0.95, 0.95))), ",\n")
cat(" \"tPower\":", list_of(mapply(tpower, c(2, 5, 20, 100), c(3, 1, 0.66, 0.1), c(1, 1, 1, 1), c(0.05, 0.01, 0.05, 0.1))), ",\n")
cat(" \"tostPower\":", list_of(mapply(tost, c(12, 5, 40, 3), c(1, 2, 1, 0.2), c(1, 4, 0.5, 1), c(0, 0.5, 0.1, 0), c(0.05, 0.05, 0.025, 0.1))), "\n}\n")
