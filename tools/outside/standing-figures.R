# What is said of the own company: standing, ranks, gap path, drift, and the standing without each company and year.

standing_figures <- function(panel, fit, case) {
  own <- case$own
  confidence <- case$confidence
  rho <- fit$persistence$used
  companies <- panel$companies
  own_code <- "row weights, cosines and calibration from the full dummy regression, own code"
  cosines <- interval_cosines(length(panel$years))
  each <- diag(length(fit$beta))[, seq_along(companies), drop = FALSE]
  levels <- calibrated_error(fit, each, cosines, rho)$standard_error
  levels[table(panel$company)[companies] < 3] <- NA
  w <- standing_weights(fit, own)
  error <- calibrated_error(fit, w, cosines, rho)
  interval <- t_interval(sum(w * fit$beta), error$standard_error, error$cosines, confidence)
  set <- rank_set_of(fit, own, rho, confidence)
  drift <- drift_of(panel, fit, case)
  without_companies <- lapply(companies, function(name) without(panel, panel$company != name, case))
  without_years <- lapply(panel$years, function(year) without(panel, panel$year != year, case))
  slopes_of <- function(refits) unlist(lapply(refits, function(refit) refit$slopes))
  standings_of <- function(refits) unlist(lapply(refits, function(refit) refit$standing))
  slope_scale <- rep(abs(fit$slopes), length(companies))
  gap <- gap_path(fit, own)
  result <- list(
    interceptErrors = figure(own_code, levels),
    persistence = figure("sum of e_t e_t-1 over sum of squares by calendar years, corrected", c(fit$persistence$pooled, fit$persistence$own[[own]]), 1),
    standing = figure(own_code, c(unlist(interval), error$calibration), c(0, 0, rep(error$standard_error, 2), 0)),
    rankSet = figure("Holm over 2(N - 1) one-sided t tests, own code", c(set$rank, set$rank_set)),
    pairs = figure(own_code, c(set$pairs$estimate, set$pairs$standard_error), max(abs(set$pairs$estimate))),
    gapPath = figure("by its definition in words, own code", c(gap$gap, gap$peers), error$standard_error),
    drift = figure("fit augmented by two trends, own code", drift, c(0, 0, drift[2], drift[2], 0)),
    withoutCompany = figure("refit without each company by qr", c(slopes_of(without_companies)), slope_scale),
    withoutCompanyStanding = figure("refit without each company by qr", standings_of(without_companies), error$standard_error),
    withoutYear = figure("refit without each year by qr", slopes_of(without_years), rep(abs(fit$slopes), length(panel$years))),
    withoutYearStanding = figure("refit without each year by qr", standings_of(without_years), error$standard_error)
  )
  if (case$form == "log") {
    ends <- unlist(interval[c("estimate", "low", "high")])
    result$standingPercent <- figure("100 (exp(.) - 1)", 100 * (exp(ends) - 1))
  }
  result
}

# Slopes and standing of the rows kept; a standing that is not defined is NA.
without <- function(panel, keep, case) {
  rest <- keep_rows(panel, keep)
  counts <- table(rest$company)
  rest <- keep_rows(rest, counts[rest$company] > 1)
  design <- full_design(rest, case$effects)
  beta <- qr.coef(qr(design, LAPACK = TRUE), rest$y)
  intercepts <- setNames(beta[seq_along(rest$companies)], rest$companies)
  has_own <- case$own %in% rest$companies && length(rest$companies) > 1
  list(
    slopes = beta[ncol(design) - ncol(rest$x) + seq_len(ncol(rest$x))],
    standing = if (has_own) intercepts[[case$own]] - mean(intercepts[names(intercepts) != case$own]) else NA
  )
}

gap_path <- function(fit, own) {
  panel <- fit$panel
  peers <- setdiff(panel$companies, own)
  at <- which(panel$company == own)
  present <- lapply(panel$year[at], function(year) which(panel$year == year & panel$company != own))
  count <- lengths(present)
  other <- vapply(present, function(rows) mean(fit$residuals[rows]), 0)
  list(gap = fit$intercepts[[own]] + fit$residuals[at] - mean(fit$intercepts[peers]) - other, peers = count)
}

# Estimate, standard error, ends and p of delta_own - delta_peers.
drift_of <- function(panel, fit, case) {
  if (sum(panel$company == case$own) < 8) return(rep(NA, 5))
  trend <- panel$year - mean(panel$year)
  is_own <- panel$company == case$own
  trends <- if (case$effects == "company") cbind(trend * is_own, trend * !is_own) else cbind(trend * is_own)
  wide <- dummy_fit(panel, case$effects, cbind(panel$x, trends))
  w <- numeric(length(wide$beta))
  w[wide$slope_places[ncol(panel$x) + seq_len(ncol(trends))]] <- c(1, -1)[seq_len(ncol(trends))]
  cosines <- rank_cosines(length(panel$years))
  error <- calibrated_error(wide, w, cosines, fit$persistence$used)$standard_error
  interval <- t_interval(sum(w * wide$beta), error, cosines, case$confidence)
  c(unlist(interval), 2 * pt(-abs(interval$estimate / error), cosines))
}
