#!/usr/bin/env Rscript
# Figures of base R and MASS for the cases of verify.mjs, which come in on standard input, one a line:
# number;task;name=value,value,...;name=... and go out as number;figure=value;... Estimators are in estimators.R.
suppressPackageStartupMessages(library(MASS))
options(warn = -1)
num <- function(x) ifelse(is.na(x), "NA", ifelse(is.infinite(x), ifelse(x > 0, "Infinity", "-Infinity"), sprintf("%.17g", x)))

location <- function(a) {
  x <- a$x; share <- c("10" = 0.1, "25" = 0.25, "50" = 0.5, "90" = 0.9)
  q <- unlist(lapply(1:9, function(type) setNames(quantile(x, share, type = type), paste0("type", type, "At", names(share)))))
  c(mean = mean(x), sd = sd(x), median = median(x), mad = mad(x, constant = 1.483), q)
}
# hubers gives up after 30 rounds without a word; `rest` is the size of one more round, in units of the scale.
hubers_ <- function(a) {
  x <- a$x; h <- MASS::hubers(x, tol = 1e-14); th <- 2 * pnorm(1.5) - 1; beta <- th + 2.25 * (1 - th) - 3 * dnorm(1.5)
  w <- pmin(pmax(h$mu - 1.5 * h$s, x), h$mu + 1.5 * h$s); s <- sd(w) / sqrt(beta)
  c(location = h$mu, scale = h$s, rest = max(abs(mean(w) - h$mu), abs(s - h$s)) / h$s)
}
density_ <- function(a) {
  x <- a$x; h <- a$bandwidth; e <- quantile(x, c(0.1, 0.9), names = FALSE)
  at <- c(e[1], 0.7 * e[1] + 0.3 * e[2], 0.4 * e[1] + 0.6 * e[2], e[2])
  s <- sapply(at, function(p) mean(dnorm((p - x) / h)) / h)
  d <- density(x, bw = h, n = 2^14); g <- approx(d$x, d$y, at)$y
  setNames(c(s, g, max(s)), c(paste0("sum", 0:3), paste0("grid", 0:3), "peak"))
}
fit <- function(prefix, f, at) {
  s <- summary(f); ci <- confint(f); m <- predict(f, data.frame(x = at), interval = "confidence")
  v <- c(Intercept = s$coefficients[1, 1], Slope = s$coefficients[2, 1], InterceptSe = s$coefficients[1, 2], SlopeSe = s$coefficients[2, 2],
    ResidualSd = s$sigma, RSquared = s$r.squared, InterceptLow = ci[1, 1], InterceptHigh = ci[1, 2], SlopeLow = ci[2, 1], SlopeHigh = ci[2, 2],
    Fitted = m[1], FittedLow = m[2], FittedHigh = m[3])
  setNames(v, paste0(prefix, names(v)))
}
line <- function(a) {
  x <- a$x; y <- a$y; w <- a$weights; f <- lm(y ~ x); p <- predict(f, data.frame(x = a$at), interval = "prediction")
  c(fit("ols", f, a$at), fit("wls", lm(y ~ x, weights = w), a$at), predictionLow = p[2], predictionHigh = p[3])
}
correlation <- function(a) {
  x <- a$x; y <- a$y; r <- cor.test(x, y); ci <- if (is.null(r$conf.int)) c(NA, NA) else r$conf.int
  s <- cor.test(x, y, method = "spearman", exact = FALSE)
  exact <- length(x) < 50 && !any(duplicated(x)) && !any(duplicated(y))
  k <- cor.test(x, y, method = "kendall", exact = exact)
  c(pearson = r$estimate[[1]], pearsonP = r$p.value, pearsonLow = ci[1], pearsonHigh = ci[2], spearman = s$estimate[[1]], spearmanP = s$p.value,
    kendall = k$estimate[[1]], kendallP = k$p.value)
}
two_groups <- function(a) {
  exact <- length(a$x) < 50 && length(a$y) < 50 && !any(duplicated(c(a$x, a$y)))
  c(welch = t.test(a$x, a$y)$p.value, rank = wilcox.test(a$x, a$y, exact = exact, correct = TRUE)$p.value)
}
anova_ <- function(a) {
  g <- factor(a$group); t <- summary(aov(a$x ~ g))[[1]]
  c(betweenSquares = t[1, 2], withinSquares = t[2, 2], totalSquares = t[1, 2] + t[2, 2], fRatio = t[1, 4], pValue = t[1, 5])
}
# Components of variance from the mean squares of aov, as ISO 5725-2 forms them.
iso5725 <- function(a) {
  g <- factor(a$group); t <- summary(aov(a$x ~ g))[[1]]; n <- tabulate(g); N <- sum(n); within <- t[2, 3]
  between <- max(0, (t[1, 3] - within) / ((N - sum(n^2) / N) / (length(n) - 1)))
  c(mean = mean(a$x), repeatabilityVariance = within, betweenVariance = between, reproducibilityVariance = within + between)
}
kruskal <- function(a) { k <- kruskal.test(a$x, factor(a$group)); c(statistic = k$statistic[[1]], pValue = k$p.value) }
both <- function(a, p, q) c(cdf = p(a$at), survival = p(a$at, lower.tail = FALSE), quantile = q(a$p, TRUE), upperQuantile = q(a$p, FALSE))
# R's qnorm loses digits of upper quantiles near 1/2 and its qf those of small values; symmetry and qbeta keep them.
normal <- function(a) both(a, pnorm, function(p, lower) if (lower) qnorm(p) else -qnorm(p))
student <- function(a) both(a, function(x, ...) pt(x, a$a, ...), function(p, lower) qt(p, a$a, lower.tail = lower))
chi <- function(a) both(a, function(x, ...) pchisq(x, a$a, ...), function(p, lower) qchisq(p, a$a, lower.tail = lower))
odds <- function(p, a, b, lower) {
  x <- qbeta(p, a / 2, b / 2, lower.tail = lower); y <- qbeta(p, b / 2, a / 2, lower.tail = !lower)
  (if (x < 0.5) x / (1 - x) else (1 - y) / y) * b / a
}
f_ <- function(a) both(a, function(x, ...) pf(x, a$a, a$b, ...), function(p, lower) odds(p, a$a, a$b, lower))
beta_ <- function(a) both(a, function(x, ...) pbeta(x, a$a, a$b, ...), function(p, lower) qbeta(p, a$a, a$b, lower.tail = lower))
binomial_ <- function(a) c(mass = dbinom(a$at, a$a, a$b), cdf = pbinom(a$at, a$a, a$b), survival = pbinom(a$at, a$a, a$b, lower.tail = FALSE),
  quantile = qbinom(a$p, a$a, a$b))
proportion <- function(a) {
  w <- prop.test(a$positives, a$trials, conf.level = a$confidence, correct = FALSE)$conf.int
  e <- binom.test(a$positives, a$trials, conf.level = a$confidence)$conf.int
  c(wilsonLow = w[1], wilsonHigh = w[2], exactLow = e[1], exactHigh = e[2])
}
mcnemar <- function(a) {
  b <- a$positives; c <- a$trials - b; m <- matrix(c(9, c, b, 8), 2); u <- mcnemar.test(m, correct = FALSE); v <- mcnemar.test(m)
  c(chiSquare = u$statistic[[1]], corrected = v$statistic[[1]], probability = u$p.value, probabilityCorrected = v$p.value,
    exact = binom.test(b, b + c)$p.value)
}
tasks <- list(location = location, hubers = hubers_, density = density_, line = line, correlation = correlation, twoGroups = two_groups,
  anova = anova_, iso5725 = iso5725, kruskal = kruskal, normal = normal, studentT = student, chiSquare = chi, f = f_, beta = beta_,
  binomial = binomial_, proportion = proportion, mcNemar = mcnemar)
for (text in readLines(input <- file("stdin"))) {
  parts <- strsplit(text, ";")[[1]]; pairs <- strsplit(parts[-(1:2)], "=")
  a <- lapply(pairs, function(p) as.numeric(strsplit(p[2], ",")[[1]])); names(a) <- sapply(pairs, `[`, 1)
  v <- tryCatch(tasks[[parts[2]]](a), error = function(e) stop(parts[2], " ", text, ": ", conditionMessage(e)))
  cat(parts[1], paste(names(v), num(v), sep = "=", collapse = ";"), sep = ";"); cat("\n")
}
close(input)
cat(sprintf("#R %s.%s, MASS %s\n", R.version$major, R.version$minor, packageVersion("MASS")))
