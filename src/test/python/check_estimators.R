# Looks with R evd (Debian r-cran-evd) at what our estimators made of random samples.
#   Rscript check_estimators.R TABLE.csv    the table of org.wintersill.climatology.extreme.EstimateTable; exits 1 when something differs
suppressPackageStartupMessages(library(evd))
rows <- read.csv(commandArgs(trailingOnly = TRUE)[1], stringsAsFactors = FALSE)
passed <- 0
failed <- 0
worst <- list()
close <- function(name, sample, ours, theirs, tolerance) {
  difference <- abs(ours - theirs)
  worst[[name]] <<- max(c(worst[[name]], difference))
  if (is.finite(difference) && difference <= tolerance) passed <<- passed + 1 else {
    failed <<- failed + 1
    cat("FAILED sample", sample, name, "ours", ours, "R", theirs, "\n")
  }
}
for (i in seq_len(nrow(rows))) {
  row <- rows[i, ]
  x <- as.numeric(strsplit(row$values, " ")[[1]])
  n <- length(x)
  close("log-likelihood", row$sample, row$ml_loglik, sum(dgev(x, row$ml_loc, row$ml_scale, row$ml_xi, log = TRUE)), 1e-6)
  start <- list(loc = row$ml_loc, scale = row$ml_scale, shape = row$ml_xi)
  fit <- fgev(x, start = start, method = "Nelder-Mead", control = list(reltol = 1e-14, maxit = 5000), std.err = FALSE)
  inner <- abs(row$ml_xi) < 0.499
  if (inner) {
    close("location", row$sample, row$ml_loc, fit$estimate[["loc"]], 2e-4 * max(1, row$ml_scale))
    close("scale", row$sample, row$ml_scale, fit$estimate[["scale"]], 2e-4 * max(1, row$ml_scale))
    close("xi", row$sample, row$ml_xi, fit$estimate[["shape"]], 2e-4)
    close("highest log-likelihood", row$sample, row$ml_loglik, -fit$deviance / 2, 1e-5)
    errors <- try(fgev(x, start = as.list(fit$estimate), method = "BFGS")$std.err, silent = TRUE)
    if (!inherits(errors, "try-error")) {
      for (name in c("loc", "scale", "shape")) {
        ours <- row[[paste0("se_", if (name == "shape") "xi" else name)]]
        close(paste("standard error of", name), row$sample, ours / errors[[name]], 1, 0.02)
      }
    }
    # the level of fifty winters and the ends of its profile interval, by a likelihood that is parametrised by it
    for (end in c("low50", "high50")) {
      level <- row[[end]]
      if (is.finite(level)) {
        profile <- function(p) {
          if (abs(p[2]) > 0.5) return(1e10)
          scale <- exp(p[1])
          -sum(dgev(x, level - qgev(1 - 1 / 50, 0, scale, p[2]), scale, p[2], log = TRUE))
        }
        best <- Inf
        for (shape in c(row$ml_xi, 0, -0.2, 0.2)) {
          found <- optim(c(log(row$ml_scale), shape), function(p) min(1e10, profile(p)), control = list(reltol = 1e-13, maxit = 5000))
          best <- min(best, found$value)
        }
        close(paste("likelihood lost at", end), row$sample, 2 * (best + row$ml_loglik), qchisq(0.90, 1), 1e-3)
      }
    }
  }
  centred <- data.frame(t = seq_len(n) - (n + 1) / 2)
  moving <- fgev(x, nsloc = centred, start = list(loc = row$ml_loc, loct = row$trend_slope, scale = row$ml_scale, shape = row$ml_xi),
                 method = "Nelder-Mead", control = list(reltol = 1e-14, maxit = 10000), std.err = FALSE)
  if (abs(moving$estimate[["shape"]]) < 0.499 && inner) {
    close("trend log-likelihood", row$sample, row$trend_loglik, -moving$deviance / 2, 1e-4)
    close("trend p-value", row$sample, row$trend_p, pchisq(max(0, fit$deviance - moving$deviance), 1, lower.tail = FALSE), 1e-3)
  }
}
for (i in seq_len(nrow(rows))) {
  close("false discovery", rows$sample[i], rows$bh_called[i], as.numeric(p.adjust(rows$mk_p, "BH")[i] <= 0.1), 0)
}
for (name in names(worst)) cat("ok    ", name, "largest difference", format(worst[[name]], digits = 3), "\n")
cat(passed, "passed,", failed, "failed\n")
quit(status = if (failed > 0) 1 else 0)
