# Slopes, intercepts, goodness and every covariance of the fixed effects regression.

full_lm <- function(panel, effects) {
  years <- if (effects == "company,year" ) "factor(year)"
  lm(reformulate(c("factor(company)", years, colnames(package_frame(panel))[-(1:3)]), "y"), package_frame(panel))
}

fit_figures <- function(panel, fit, effects) {
  within <- package_fit(panel, effects)
  error <- sqrt(diag(vcov(within)))
  full <- summary(full_lm(panel, effects))
  pooled <- lm(model_formula(panel), package_frame(panel))
  pooled_summary <- summary(pooled)
  years <- if (effects == "company,year") "+ factor(year)" else ""
  f_slopes <- {
    kept <- if (effects == "company,year") c("factor(company)", "factor(year)") else "factor(company)"
    anova(lm(reformulate(kept, "y"), package_frame(panel)), full_lm(panel, effects))
  }
  poolability <- poolability_of(panel, effects)
  f_value <- full$fstatistic
  list(
    slopes = figure("coef(plm(model = 'within'))", coef(within), error),
    intercepts = figure("full dummy regression by qr, own code", fit$intercepts, max(abs(fit$intercepts))),
    deviations = figure("intercepts less their unweighted mean", fit$intercepts - mean(fit$intercepts), max(abs(fit$intercepts))),
    yearEffects = if (!is.null(fit$year_effects)) {
      figure("full dummy regression by qr with contr.sum years", fit$year_effects, max(abs(fit$year_effects)))
    },
    goodness = figure(
      paste("summary(lm(y ~ company", years, "+ x)); within R2 and F of the slopes by anova against the effects alone"),
      c(1 - f_slopes$RSS[2] / f_slopes$RSS[1], full$r.squared, full$adj.r.squared, full$sigma)
    ),
    fAll = figure("summary(lm(...))$fstatistic", c(f_value, pf(f_value[1], f_value[2], f_value[3], lower.tail = FALSE))),
    fSlopes = figure("anova(effects only, effects and slopes)", c(f_slopes$F[2], f_slopes$Df[2], f_slopes$Res.Df[2], f_slopes[["Pr(>F)"]][2])),
    pooled = figure("summary(lm(y ~ x))", c(coef(pooled), pooled_summary$r.squared, pooled_summary$fstatistic[1]), sqrt(diag(vcov(pooled)))),
    poolability = figure("restricted against full sum of squares, own code", unlist(poolability))
  )
}

covariance_figures <- function(panel, effects, slopes, confidence) {
  calls <- c(
    classical = "vcov(plm)", cr0 = "plm::vcovHC(method = 'arellano', type = 'HC0')",
    cr1 = "cr0 * G/(G-1) * (n-1)/(n-K-1)", cr2 = "clubSandwich::vcovCR(type = 'CR2') on demeaned columns; coef_test Satterthwaite",
    hc0 = "sandwich::vcovHC(lm with dummies)", hc1 = "sandwich::vcovHC(lm with dummies)",
    hc2 = "sandwich::vcovHC(lm with dummies)", hc3 = "sandwich::vcovHC(lm with dummies)",
    `two-way` = "plm::vcovDC(type = 'HC0'), negative eigenvalues set to 0",
    `driscoll-kraay` = "plm::vcovSCC(type = 'HC0', maxlag = floor(T^0.25))"
  )
  figures <- lapply(names(calls), function(name) {
    covariance <- covariance_of(panel, effects, name)
    error <- sqrt(diag(covariance$v))
    df <- rep_len(covariance$df, length(error))
    interval <- t_interval(slopes, error, df, confidence)
    p <- 2 * pt(-abs(slopes / error), df)
    # K of each: standard errors, degrees of freedom, p values, lower and upper ends.
    figure(calls[[name]], c(error, df, p, interval$low, interval$high), c(0 * error, 0 * df, 0 * p, error, error))
  })
  setNames(figures, paste0("covariance.", names(calls)))
}

wild_figure <- function(panel, effects, slopes, confidence) {
  call <- "all 2^N sign vectors, null imposed, t from cr0, own code"
  if (length(panel$companies) > 12) return(NULL)
  error <- sqrt(diag(covariance_of(panel, effects, "cr0")$v))
  p <- NULL
  ends <- NULL
  for (slope in seq_along(slopes)) {
    p_of <- wild_p_value(panel, effects, slope)
    p <- c(p, p_of(0))
    ends <- rbind(ends, if (2^(1 - length(panel$companies)) <= 1 - confidence) wild_interval(p_of, slopes[slope], error[slope], confidence) else c(NA, NA))
  }
  figure(call, c(error, p, ends), c(0 * error, 0 * p, error, error))
}
