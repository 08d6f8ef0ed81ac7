# Expected values, bands, starting points, familiar range and reaching a value, by the definitions in words.

horizons <- c(1, 3, 5)
band_confidence <- 0.8

# Plans in the panel's own measure: the last actual values, then more and less of the first regressor, then of all.
plans_of <- function(panel, own) {
  rows <- if (is.null(panel$levels)) panel else panel$levels
  at <- which(rows$company == own)
  last <- rows$x[at[length(at)], ]
  first <- replace(last, 1, last[1] * 1.2)
  unname(list(last, first, last * 1.1, last * 3, colMeans(rows$x[at, , drop = FALSE])))
}

prediction_figures <- function(panel, fit, case) {
  own <- case$own
  at <- which(panel$company == own)
  last <- at[length(at)]
  has_band <- length(at) >= 5
  scale_of <- if (case$form == "log") log else identity
  plans <- plans_of(panel, own)
  cosines <- interval_cosines(length(panel$years))
  rho <- fit$persistence$used
  error_of <- function(w) calibrated_error(fit, w, cosines, rho)
  year_choices <- list(none = NULL)
  if (case$effects == "company,year") {
    coded <- contr.sum(length(panel$years))
    year_choices <- list(last = coded[length(panel$years), ], meanOfLastThree = colMeans(tail(coded, 3)))
  }
  w_of <- function(x, year, intercept = 1) {
    w <- company_weights(fit, setNames(intercept, own))
    w[fit$slope_places] <- x
    w[fit$year_places] <- year
    w
  }
  result <- list()
  in_measure <- if (case$form == "log") exp else identity # a band is given in the panel's measure
  smear <- if (case$form == "log") mean(exp(fit$residuals))
  for (choice in names(year_choices)) {
    year <- year_choices[[choice]]
    suffix <- if (choice == "none") "" else paste0(".", choice)
    expected <- NULL
    bands <- NULL
    carried <- NULL
    from_last <- NULL
    for (plan in plans) {
      x <- scale_of(plan)
      w <- w_of(x, year)
      point <- sum(w * fit$beta)
      calibrated <- error_of(w)
      error <- calibrated$standard_error
      expected <- rbind(expected, unlist(t_interval(point, error, calibrated$cosines, case$confidence)))
      for (h in horizons) {
        spread <- spread_of(panel, fit, own, h)
        level <- max(spread$s2 * (1 - spread$overlap) + error^2, spread$s2 * (1 - spread$rho^(2 * h)))
        reach <- qt(1 - (1 - band_confidence) / 2, spread$df) * sqrt(level)
        bands <- rbind(bands, if (has_band) in_measure(point + c(-1, 1) * reach) else c(NA, NA))
        fade <- spread$rho^h
        year_last <- if (length(fit$year_places) > 0) contr.sum(length(panel$years))[panel$position[last], ]
        carry <- w_of(x - fade * panel$x[last, ], year - fade * year_last, 1 - fade)
        carry_error <- error_of(carry)$standard_error
        carry_point <- point + fade * fit$residuals[last]
        reach <- qt(1 - (1 - band_confidence) / 2, spread$df) * sqrt(spread$s2 * (1 - fade^2) + carry_error^2)
        interval <- t_interval(carry_point, carry_error, calibrated$cosines, case$confidence)
        from_last <- c(from_last, point + if (is.null(smear)) 0 else log(smear), carry_point)
        carried_band <- if (has_band) in_measure(carry_point + c(-1, 1) * reach) else c(NA, NA)
        carried <- rbind(carried, c(unlist(interval), carried_band))
      }
    }
    result[[paste0("expected", suffix)]] <- figure("a_own + x'b with the calibrated interval, own code", t(expected), expected[1, 2])
    result[[paste0("band", suffix)]] <- figure("band of the market value at the model's level, h = 1, 3, 5, own code", t(bands), if (is.null(smear)) expected[1, 2] else 0)
    result[[paste0("carriedGap", suffix)]] <- figure(
      "best linear unbiased prediction under AR(1), h = 1, 3, 5: estimate, error, ends, band; own code", t(carried), expected[1, 2])
    result[[paste0("fromLast", suffix)]] <- figure(
      "expected value less the last actual one, h = 1, 3, 5, at the model's level and with the gap carried; logs in log form",
      from_last - panel$y[last], expected[1, 2])
    if (!is.null(smear)) {
      result[[paste0("expectedValue", suffix)]] <- figure("exp(.) * mean(exp(e)), interval exp(ends) * mean(exp(e))", t(exp(expected[, c(1, 3, 4)]) * smear))
      result[[paste0("medianValue", suffix)]] <- figure("exp(.)", exp(expected[, 1]))
    }
    result[[paste0("reachedValue", suffix)]] <- reached_figure(panel, fit, case, w_of(scale_of(plans[[1]]), year), cosines, smear)
  }
  if (!is.null(smear)) result$smearing <- figure("mean(exp(e)) over all rows and over the own company's", c(smear, mean(exp(fit$residuals[at]))))
  result$planDifference <- difference_figure(panel, case, lapply(plans, scale_of))
  result$peersMean <- peers_figure(panel, fit, own)
  result$familiarRange <- familiar_figure(panel, own, lapply(plans, scale_of))
  list(plans = plans, figures = result)
}

# What the band of one year needs: s^2 and its t, the persistence, and how far the year overlaps with the observed ones.
spread_of <- function(panel, fit, own, h) {
  at <- which(panel$company == own)
  rho <- fit$persistence$used[[own]]
  rows <- length(at)
  shared <- sum(rho^abs(outer(panel$year[at], panel$year[at], "-"))) / rows
  list(
    rho = rho, s2 = sum(fit$residuals[at]^2) / (rows - shared),
    overlap = 2 / rows * sum(rho^(max(panel$year[at]) + h - panel$year[at])),
    df = max(2, rows * (1 - rho^2) / (1 + rho^2) - 1)
  )
}

# x'Q^-1 x of each plan, then the largest of the own company and of any.
familiar_figure <- function(panel, own, plans) {
  within <- apply(panel$x, 2, function(column) column - ave(column, panel$company))
  decomposition <- qr(within, LAPACK = TRUE)
  leverage_of <- function(distances) {
    colSums(backsolve(qr.R(decomposition), t(distances)[decomposition$pivot, , drop = FALSE], transpose = TRUE)^2)
  }
  means <- colMeans(panel$x[panel$company == own, , drop = FALSE])
  planned <- leverage_of(t(vapply(plans, function(x) x - means, numeric(ncol(panel$x)))))
  observed <- leverage_of(within)
  figure("x'(X'X)^-1 x of demeaned regressors, qr", c(planned, max(observed[panel$company == own]), max(observed)), max(observed))
}

# The first regressor that makes the expected value reach 1.05 and 2 times that of the plan, and Fieller's range: c and
# the lambdas taken once at the solution, (A0 + xi A1 - target)^2 <= t^2 c T mean_j (L_j0 + xi L_j1)^2.
reached_figure <- function(panel, fit, case, w, cosines, smear) {
  rho <- fit$persistence$used
  w1 <- replace(numeric(length(w)), fit$slope_places[1], 1)
  w0 <- replace(w, fit$slope_places[1], 0)
  a0 <- sum(w0 * fit$beta)
  a1 <- sum(w1 * fit$beta)
  # Of whatever weighs the own company alone.
  clock <- contrast_clocks(fit, w0, cosines)
  reached <- NULL
  for (factor in c(1.05, 2)) {
    target <- if (case$form == "log") sum(w * fit$beta) + log(factor) else sum(w * fit$beta) * factor
    xi <- (target - a0) / a1
    solution <- calibrated_error(fit, w0 + xi * w1, cosines, rho)
    l0 <- calibrated_error(fit, w0, cosines, rho, clock)$lambdas
    l1 <- calibrated_error(fit, w1, cosines, rho, clock)$lambdas
    size <- qt(1 - (1 - case$confidence) / 2, clock$cosines)^2 * solution$calibration * length(panel$years)
    leading <- a1^2 - size * mean(l1^2)
    middle <- a1 * (a0 - target) - size * mean(l0 * l1)
    constant <- (a0 - target)^2 - size * mean(l0^2)
    root <- middle^2 - leading * constant
    ends <- if (leading > 0 && root >= 0) (-middle + c(-1, 1) * sqrt(root)) / leading else c(NA, NA)
    reached <- c(reached, if (is.null(smear)) c(target, xi, ends) else c(exp(target) * smear, exp(c(xi, ends))))
  }
  figure("solution and range by Fieller (1954), own code; nulls: no finite range", reached, abs(reached[2]))
}

# Each later plan less the last actual values, b'(x - x_last), with the CR2 covariance and the degrees of freedom of that
# contrast: estimates, standard errors, ends.
difference_figure <- function(panel, case, plans) {
  design <- demeaned_design(panel, case$effects)
  regression <- lm(design$y ~ 0 + design$u)
  contrasts <- matrix(0, length(plans) - 1, ncol(design$u))
  contrasts[, design$slopes] <- t(vapply(plans[-1], function(x) x - plans[[1]], numeric(ncol(panel$x))))
  found <- clubSandwich::linear_contrast(regression, vcov = "CR2", cluster = match(panel$company, panel$companies),
    contrasts = contrasts, level = case$confidence, test = "Satterthwaite")
  figure("clubSandwich::linear_contrast(vcov = 'CR2', test = 'Satterthwaite') on demeaned columns",
    c(found$Est, found$SE, found$CI_L, found$CI_U), c(found$SE, 0 * found$SE, found$SE, found$SE))
}

# The last actual value less the mean of the peers' of that year: intercepts, slopes, residuals, and all together.
peers_figure <- function(panel, fit, own) {
  at <- which(panel$company == own)
  last <- at[length(at)]
  peers <- which(panel$year == panel$year[last] & panel$company != own)
  intercepts <- fit$intercepts[[own]] - mean(fit$intercepts[panel$company[peers]])
  slopes <- sum(fit$slopes * (panel$x[last, ] - colMeans(panel$x[peers, , drop = FALSE])))
  residuals <- fit$residuals[last] - mean(fit$residuals[peers])
  parts <- c(intercepts, slopes, residuals, panel$y[last] - mean(panel$y[peers]))
  figure("by its definition in words, own code", parts, max(abs(parts)))
}
