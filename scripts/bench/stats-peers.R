#!/usr/bin/env Rscript
# Times functions of R on the data of the benchmark. usage: stats-peers.R folder, with lines "function n bandwidth" on
# standard input. Prints the version, then a line "function n ms ms ..." for each.
suppressPackageStartupMessages({library(MASS); library(robustbase)})
folder <- commandArgs(TRUE)[1]
clock <- function() 1000 * as.numeric(Sys.time())
times <- function(call) {
  batch <- 1; begun <- clock()
  sample <- function() { since <- clock(); for (i in seq_len(batch)) call(); clock() - since }
  while (clock() - begun < 100) if (sample() < 2) batch <- batch * 2
  found <- c(); since <- clock()
  while (length(found) < 5 || (length(found) < 41 && clock() - since < 400)) found <- c(found, sample() / batch)
  found
}
cat(sprintf("R %s.%s, MASS %s, robustbase %s\n", R.version$major, R.version$minor, packageVersion("MASS"),
  packageVersion("robustbase")))
for (line in readLines(file("stdin"))) {
  parts <- strsplit(line, " ")[[1]]; n <- as.integer(parts[2]); bandwidth <- as.numeric(parts[3])
  y <- readBin(file.path(folder, sprintf("y-%d.bin", n)), "double", n)
  call <- switch(parts[1], hubers = function() hubers(y), qn = function() Qn(y), sn = function() Sn(y),
    median = function() median(y), mad = function() mad(y), density = function() density(y, bw = bandwidth, n = 512))
  cat(parts[1], n, sprintf("%.6f", times(call))); cat("\n")
}
