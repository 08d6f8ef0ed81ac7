# Recomputes a fit from the rows it used, with public packages only, and prints how far the results file is from it.
#
#   Rscript replication.R            in the folder that holds rows.csv and results.json
#
# Needs R 4 or newer with the packages plm, sandwich, clubSandwich and jsonlite.
#
# rows.csv      one row a company and year: company, year, outcome, regressors in the order of the results, then the row
#               of the imported file and whether the company has more rows than this. Numbers are in the panel's own
#               measure, also for a fit in logarithms; with a lag of one year the regressors are already those of the
#               year before. An apostrophe that keeps spreadsheets from computing a text is taken off.
# results.json  the fit: its specification, slopes, intercepts, standing and the rest.
#
# Slopes and most covariances come from packages. The intervals of intercepts and of the standing come from the full
# dummy regression below, by the definitions written beside each function.
# A difference is relative to the larger of the figure and its standard error. Exit status 1 above 1e-8.
# All of it is one file, however long, so that a pack carries one script.

tolerance <- 1e-8
largest_dense_design <- 1e7 # cells; beyond that the full dummy regression takes many minutes and gigabytes

# ---- Rows ------------------------------------------------------------------------------------------------------------

# A panel in the model's scale, sorted by company and year; `x` is a matrix, a column a regressor.
panel_of <- function(company, year, y, x) {
  by_company_and_year <- order(company, year, method = "radix")
  company <- company[by_company_and_year]
  years <- sort(unique(year))
  list(
    company = company, year = year[by_company_and_year], y = y[by_company_and_year],
    x = x[by_company_and_year, , drop = FALSE],
    companies = unique(company), years = years,
    position = match(year[by_company_and_year], years)
  )
}

keep_rows <- function(panel, keep) {
  panel_of(panel$company[keep], panel$year[keep], panel$y[keep], panel$x[keep, , drop = FALSE])
}

# A text as it was before it got an apostrophe for spreadsheets.
plain_text <- function(text) {
  text <- enc2utf8(text)
  guarded <- grepl("^'+[=+@\t\r\n\uff1d\uff0b\uff0d\uff20-]", text, perl = TRUE)
  ifelse(guarded, substring(text, 2), text)
}

# The rows in the model's scale. Companies go by codes from here on, which no locale can spell otherwise: `code_of`
# gives those of names.
read_rows <- function(file, results) {
  rows <- read.csv(file, check.names = FALSE, encoding = "UTF-8", na.strings = character(), colClasses = "character")
  wanted <- enc2utf8(c(results$outcome, vapply(results$slopes, function(slope) slope$name, "")))
  found <- plain_text(names(rows)[2 + seq_along(wanted)])
  if (results$specification$lag == 1) found[-1] <- sub(" \\(year before\\)$", "", found[-1])
  if (!identical(found, wanted)) {
    stop("rows.csv: expected the columns ", toString(wanted), " after company and year; found ", toString(found))
  }
  numbers <- vapply(rows[2 + seq_along(wanted)], as.numeric, numeric(nrow(rows)))
  numbers <- matrix(numbers, nrow(rows))
  if (results$specification$form == "log") numbers <- log(numbers)
  names_read <- plain_text(rows[[1]])
  known <- unique(names_read)
  code_of <- function(names) sprintf("%07d", match(enc2utf8(names), known))
  panel <- panel_of(code_of(names_read), as.integer(rows[[2]]), numbers[, 1], numbers[, -1, drop = FALSE])
  list(panel = panel, code_of = code_of)
}

# ---- The full dummy regression ---------------------------------------------------------------------------------------

# Year columns coded to effects that sum to zero over the years, unweighted: T - 1 columns.
year_columns <- function(panel) {
  count <- length(panel$years)
  contr.sum(count)[panel$position, , drop = FALSE]
}

# One dummy a company and no constant, year columns where asked, and the regressors.
full_design <- function(panel, effects, x = panel$x) {
  dummies <- outer(panel$company, panel$companies, "==") + 0
  cbind(dummies, if (effects == "company,year") year_columns(panel), x)
}

# Least squares on the full design by a Householder QR decomposition.
dummy_fit <- function(panel, effects, x = panel$x) {
  companies <- panel$companies
  design <- full_design(panel, effects, x)
  decomposition <- qr(design, LAPACK = TRUE)
  q <- qr.Q(decomposition)
  r <- qr.R(decomposition)
  beta <- numeric(ncol(design))
  beta[decomposition$pivot] <- backsolve(r, crossprod(q, panel$y))
  residuals <- drop(panel$y - design %*% beta)
  # One step of refinement takes out what the decomposition rounded.
  correction <- numeric(ncol(design))
  correction[decomposition$pivot] <- backsolve(r, crossprod(q, residuals))
  beta <- beta + correction
  residuals <- drop(panel$y - design %*% beta)
  years <- length(companies) + seq_len(ncol(design) - length(companies) - ncol(x))
  slopes <- ncol(design) - ncol(x) + seq_len(ncol(x))
  list(
    panel = panel, q = q, r = r, pivot = decomposition$pivot, beta = beta, residuals = residuals,
    intercepts = setNames(beta[seq_along(companies)], companies), slopes = beta[slopes], slope_places = slopes,
    year_places = years,
    year_effects = if (length(years) > 0) drop(contr.sum(length(panel$years)) %*% beta[years]),
    degrees_of_freedom = nrow(design) - ncol(design)
  )
}

# Contrasts as columns over the coefficients of the full regression.
company_weights <- function(fit, weights) {
  w <- numeric(length(fit$beta))
  w[match(names(weights), fit$panel$companies)] <- weights
  w
}
standing_weights <- function(fit, own) {
  companies <- fit$panel$companies
  company_weights(fit, setNames(ifelse(companies == own, 1, -1 / (length(companies) - 1)), companies))
}

# ---- The calibrated interval of contrasts with company or year weights -----------------------------------------------

interval_cosines <- function(years) max(3, round(0.4 * years^(2 / 3)))
rank_cosines <- function(years) max(3, floor(years / 2.5))

# Persistence of errors over consecutive calendar years of one company, corrected for the demeaning (Kendall 1954;
# Nickell 1981): pooled, each company's own where it has 8 rows, and the larger of the two, which the intervals use.
persistence_of <- function(panel, e) {
  corrected <- function(raw, rows) min(0.95, max(0, (raw + 1 / rows) / (1 - 3 / rows)))
  n <- length(e)
  is_next <- c(FALSE, panel$company[-1] == panel$company[-n] & diff(panel$year) == 1)
  at <- which(is_next)
  products <- tapply(e[at] * e[at - 1], factor(panel$company[at], panel$companies), sum, default = 0)
  squares <- tapply(e[at - 1]^2, factor(panel$company[at], panel$companies), sum, default = 0)
  rows <- table(factor(panel$company, panel$companies))
  mean_rows <- n / length(panel$companies)
  pooled <- if (sum(squares) > 0 && mean_rows >= 5) corrected(sum(products) / sum(squares), mean_rows) else NA
  own <- vapply(panel$companies, function(name) {
    if (rows[[name]] < 8 || squares[[name]] == 0) return(NA_real_)
    corrected(products[[name]] / squares[[name]], rows[[name]])
  }, 0)
  list(pooled = pooled, own = own, used = setNames(pmax(own, pooled, na.rm = TRUE), panel$companies))
}

# Where each year lies on the clock of a contrast, from 0 to 1 (T x columns of `w`), and how many cosines run over it.
# By the calendar u_t = (t - 1/2)/T. A company with rows in fewer than half of the years is short; where short companies
# carry half or more of sum_i w_i^2/T_i, the contrast's own rows drive the clock (a change of time by the variance profile,
# Cavaliere & Taylor 2007, 2008): u_t = (sum_{s<t} v_s + v_t/2)/sum v, v_t = sum_i (w_i/T_i)^2 over the companies with a row
# in year t. With m rows of the short company that carries most, m - 1 cosines differ from 0; below 3 the calendar stays.
contrast_clocks <- function(fit, w, cosines) {
  panel <- fit$panel
  years <- length(panel$years)
  present <- table(factor(panel$company, panel$companies), factor(panel$year, panel$years)) > 0
  rows <- rowSums(present)
  clocks <- apply(as.matrix(w)[seq_along(panel$companies), , drop = FALSE], 2, function(weights) {
    carried <- weights^2 / rows
    of_short <- ifelse(rows < years / 2, carried, 0)
    most <- if (any(of_short > 0)) rows[[which.max(of_short)]] - 1 else 0
    if (most < 3 || sum(of_short) < sum(carried) / 2) {
      return(list(places = (seq_len(years) - 0.5) / years, cosines = cosines))
    }
    profile <- colSums((weights / rows)^2 * present)
    list(places = (cumsum(profile) - profile / 2) / sum(profile), cosines = min(cosines, most))
  }, simplify = FALSE)
  list(
    places = vapply(clocks, function(clock) unname(clock$places), numeric(years)),
    cosines = vapply(clocks, function(clock) clock$cosines, 0)
  )
}

# Standard errors of contrasts (columns of `w`) with B equal-weighted cosines over the years (Lazarus, Lewis, Stock &
# Watson 2018): g = Z(Z'Z)^-1 w, h_j = sqrt(2/T) cos(pi j u) g, se^2 = T mean_j (h_j'e)^2 c with
# c = max(1, sum_i g_i'R_i g_i / (T mean_j sum_i (M h_j)_i'R_i (M h_j)_i)), R_i = rho_i^|year - year'|.
calibrated_error <- function(fit, w, cosines, rho, clocks = contrast_clocks(fit, w, cosines)) {
  w <- as.matrix(w)
  panel <- fit$panel
  years <- length(panel$years)
  g <- fit$q %*% backsolve(fit$r, w[fit$pivot, , drop = FALSE], transpose = TRUE)
  rows_of <- split(seq_along(panel$company), factor(panel$company, panel$companies))
  correlation <- lapply(panel$companies, function(name) rho[[name]]^abs(outer(panel$year[rows_of[[name]]], panel$year[rows_of[[name]]], "-")))
  form <- function(values) {
    total <- numeric(ncol(values))
    for (i in seq_along(rows_of)) {
      part <- values[rows_of[[i]], , drop = FALSE]
      total <- total + colSums(part * (correlation[[i]] %*% part))
    }
    total
  }
  denominator <- 0
  squares <- 0
  lambdas <- NULL
  for (j in seq_len(max(clocks$cosines))) {
    share <- (j <= clocks$cosines) / clocks$cosines
    h <- sqrt(2 / years) * cos(pi * j * clocks$places[panel$position, , drop = FALSE]) * g
    lambda <- drop(crossprod(h, fit$residuals))
    lambdas <- rbind(lambdas, lambda)
    squares <- squares + lambda^2 * share
    denominator <- denominator + form(h - fit$q %*% crossprod(fit$q, h)) * share
  }
  numerator <- form(g)
  calibration <- pmax(1, numerator / (years * denominator))
  calibration[denominator * years <= 1e-12 * numerator] <- NA
  list(
    standard_error = sqrt(years * squares * calibration), calibration = calibration,
    # B, which is the degrees of freedom too.
    cosines = clocks$cosines,
    # Of one contrast: its lambda_j, a number a cosine.
    lambdas = unname(lambdas)
  )
}

t_interval <- function(estimate, standard_error, degrees_of_freedom, confidence) {
  reach <- qt(1 - (1 - confidence) / 2, degrees_of_freedom) * standard_error
  list(estimate = estimate, standardError = standard_error, low = estimate - reach, high = estimate + reach)
}

# Holm over the one-sided hypotheses of each pair; the set of places that are left to the own company.
rank_set_of <- function(fit, own, rho, confidence) {
  companies <- fit$panel$companies
  cosines <- rank_cosines(length(fit$panel$years))
  peers <- setdiff(companies, own)
  w <- vapply(peers, function(peer) company_weights(fit, setNames(c(1, -1), c(own, peer))), numeric(length(fit$beta)))
  estimate <- fit$intercepts[[own]] - fit$intercepts[peers]
  calibrated <- calibrated_error(fit, w, cosines, rho)
  error <- calibrated$standard_error
  rows <- table(fit$panel$company)
  has_interval <- rows[peers] >= 3 & rows[[own]] >= 3
  error[!has_interval] <- NA
  ranked <- peers[rows[peers] >= 3]
  statistic <- (estimate / error)[ranked]
  df <- setNames(calibrated$cosines, peers)[ranked]
  p <- c(pt(-statistic, df), pt(statistic, df))
  p[is.na(p)] <- 1
  sorted <- order(p)
  alpha <- 1 - confidence
  passes <- p[sorted] <= alpha / (length(p) - seq_along(p) + 1)
  rejected <- logical(length(p))
  rejected[sorted[cumprod(passes) == 1]] <- TRUE
  lower <- sum(rejected[seq_along(ranked)])
  higher <- sum(rejected[length(ranked) + seq_along(ranked)])
  list(
    pairs = list(company = peers, estimate = unname(estimate), standard_error = unname(error), cosines = calibrated$cosines),
    rank = 1 + sum(fit$intercepts[ranked] > fit$intercepts[[own]]),
    rank_set = if (rows[[own]] >= 3) c(1 + higher, length(ranked) + 1 - lower)
  )
}

# ---- Slopes ----------------------------------------------------------------------------------------------------------

package_frame <- function(panel) {
  regressors <- setNames(as.data.frame(panel$x), paste0("x", seq_len(ncol(panel$x))))
  cbind(data.frame(company = match(panel$company, panel$companies), year = panel$year, y = panel$y), regressors)
}

model_formula <- function(panel) reformulate(paste0("x", seq_len(ncol(panel$x))), "y")

package_fit <- function(panel, effects) {
  effect <- if (effects == "company") "individual" else "twoways"
  plm::plm(model_formula(panel), plm::pdata.frame(package_frame(panel), c("company", "year")), model = "within", effect = effect)
}

# Year columns if any and regressors, less each company's means: the design U that company effects leave.
demeaned_design <- function(panel, effects) {
  years <- if (effects == "company,year") year_columns(panel)
  columns <- cbind(years, panel$x)
  less_means <- function(column) column - ave(column, panel$company)
  list(u = apply(columns, 2, less_means), y = less_means(panel$y), slopes = NCOL(columns) - ncol(panel$x) + seq_len(ncol(panel$x)))
}

# Covariance and degrees of freedom of the slopes under one of the public names.
covariance_of <- function(panel, effects, name) {
  n <- length(panel$y)
  companies <- length(panel$companies)
  years <- length(panel$years)
  regressors <- ncol(panel$x)
  parameters <- regressors + if (effects == "company,year") years - 1 else 0
  residual <- n - companies - parameters
  within <- package_fit(panel, effects)
  by_company <- function() plm::vcovHC(within, method = "arellano", type = "HC0", cluster = "group")
  plain <- function(v) matrix(as.numeric(v), regressors)
  full_regression <- function() {
    frame <- package_frame(panel)
    factors <- if (effects == "company,year") c("0", "factor(company)", "factor(year)") else c("0", "factor(company)")
    lm(reformulate(c(factors, paste0("x", seq_len(regressors))), "y"), frame)
  }
  white <- function(weight) {
    regression <- full_regression()
    v <- sandwich::vcovHC(regression, omega = function(residuals, diaghat, df) weight(residuals, diaghat, df))
    places <- ncol(v) - regressors + seq_len(regressors)
    plain(v[places, places])
  }
  unless_certain <- function(value, leverage) ifelse(leverage > 1 - 1e-10, 0, value)
  switch(name,
    classical = list(v = plain(vcov(within)), df = residual),
    cr0 = list(v = plain(by_company()), df = companies - 1),
    cr1 = list(
      v = plain(by_company()) * companies / (companies - 1) * (n - 1) / (n - parameters - 1),
      df = companies - 1
    ),
    cr2 = {
      design <- demeaned_design(panel, effects)
      regression <- lm(design$y ~ 0 + design$u)
      v <- clubSandwich::vcovCR(regression, cluster = match(panel$company, panel$companies), type = "CR2")
      test <- clubSandwich::coef_test(regression, v, test = "Satterthwaite")
      list(v = plain(as.matrix(v)[design$slopes, design$slopes]), df = test$df_Satt[design$slopes])
    },
    hc0 = list(v = white(function(e, h, df) unless_certain(e^2, h)), df = residual),
    hc1 = list(v = white(function(e, h, df) unless_certain(e^2, h) * n / df), df = residual),
    hc2 = list(v = white(function(e, h, df) unless_certain(e^2 / (1 - h), h)), df = residual),
    hc3 = list(v = white(function(e, h, df) unless_certain(e^2 / (1 - h)^2, h)), df = residual),
    `two-way` = {
      v <- plain(plm::vcovDC(within, type = "HC0"))
      parts <- eigen((v + t(v)) / 2, symmetric = TRUE)
      positive <- pmax(parts$values, 0)
      if (any(parts$values < 0)) v <- parts$vectors %*% (positive * t(parts$vectors))
      list(v = v, df = min(companies, years) - 1)
    },
    `driscoll-kraay` = list(
      v = plain(plm::vcovSCC(within, type = "HC0", maxlag = floor(years^0.25 + 1e-9))),
      df = years - 1
    ),
    stop("unknown covariance ", name)
  )
}

# ---- Wild cluster bootstrap-t, enumerated ----------------------------------------------------------------------------

# P value of slope = b0 over all 2^N sign vectors, null imposed, t from cr0 (Cameron, Gelbach & Miller 2008).
# Everything is made of each company's sums, so that one value of b0 costs a product of 2^N x N.
wild_p_value <- function(panel, effects, slope) {
  design <- demeaned_design(panel, effects)
  u <- design$u
  place <- design$slopes[slope]
  groups <- factor(panel$company, panel$companies)
  inverse <- chol2inv(qr.R(qr(u, LAPACK = FALSE)))
  others <- u[, -place, drop = FALSE]
  rest <- function(v) if (ncol(others) == 0) v else qr.resid(qr(others), v)
  rest_y <- rest(design$y)
  rest_x <- rest(u[, place])
  sums <- function(values) rowsum(u * values, groups, reorder = TRUE)
  score_y <- sums(rest_y)
  score_x <- sums(rest_x)
  row <- inverse[place, ]
  products <- t(vapply(levels(groups), function(name) {
    part <- u[groups == name, , drop = FALSE]
    drop(row %*% crossprod(part) %*% inverse)
  }, numeric(ncol(u))))
  products <- matrix(products, nlevels(groups))
  signs <- as.matrix(expand.grid(rep(list(c(1, -1)), nlevels(groups))))
  statistics <- function(b0, signs) {
    scores <- score_y - b0 * score_x
    total <- signs %*% scores
    own <- drop(scores %*% row)
    errors <- sweep(signs, 2, own, "*") - total %*% t(products)
    drop(total %*% row) / sqrt(rowSums(errors^2))
  }
  function(b0) {
    t <- abs(statistics(b0, signs))
    mean(t >= abs(statistics(b0, signs[1, , drop = FALSE])) * (1 - 1e-9))
  }
}

# Outermost values that are not rejected; NA for an end still accepted at 1e6 standard errors.
wild_interval <- function(p_of, estimate, standard_error, confidence) {
  alpha <- 1 - confidence
  accepts <- function(distance) p_of(estimate + distance * standard_error) >= alpha
  end <- function(side) {
    outside <- 1e6
    if (accepts(side * outside)) return(NA)
    inside <- outside
    while (inside > 1e-6 && !accepts(side * inside)) {
      outside <- inside
      inside <- inside * if (inside > 50) 0.5 else 0.995
    }
    while (outside - inside > 1e-13 * outside) {
      middle <- (inside + outside) / 2
      if (middle <= inside || middle >= outside) break
      if (accepts(side * middle)) inside <- middle else outside <- middle
    }
    estimate + side * inside * standard_error
  }
  c(end(-1), end(1))
}

# ---- Poolability -----------------------------------------------------------------------------------------------------

# F of equal intercepts, against one constant; with year effects against the years alone.
poolability_of <- function(panel, effects) {
  restricted_columns <- cbind(1, if (effects == "company,year") year_columns(panel), panel$x)
  full <- dummy_fit(panel, effects)
  rest <- sum(full$residuals^2)
  restricted <- sum(qr.resid(qr(restricted_columns), panel$y)^2)
  df1 <- length(panel$companies) - 1
  value <- (restricted - rest) / df1 / (rest / full$degrees_of_freedom)
  list(value = value, df1 = df1, df2 = full$degrees_of_freedom, p = pf(value, df1, full$degrees_of_freedom, lower.tail = FALSE))
}

# ---- Against the results file ----------------------------------------------------------------------------------------

# A row of the table: what was compared, how far apart, against which scale. NULL or NA on either side is no number.
difference_of <- function(figure, ours, theirs, scale = 0) {
  number <- function(values) as.numeric(vapply(values, function(value) if (is.null(value)) NA_real_ else as.numeric(value), 0))
  ours <- number(ours)
  theirs <- number(theirs)
  if (length(ours) != length(theirs)) stop(figure, ": ", length(theirs), " in the results, ", length(ours), " recomputed")
  scale <- number(scale)
  scale[is.na(scale)] <- 0
  apart <- abs(ours - theirs) / pmax(abs(theirs), scale)
  apart[ours == theirs] <- 0
  one_missing <- is.na(ours) != is.na(theirs)
  apart[one_missing] <- Inf
  compared <- !is.na(apart)
  data.frame(figure = figure, numbers = sum(compared), difference = if (any(compared)) max(apart[compared]) else NA_real_)
}

field <- function(list, name) lapply(list, function(entry) entry[[name]])

compare_estimates <- function(panel, results) {
  within <- package_fit(panel, results$specification$effects)
  difference_of("slopes", unname(coef(within)), field(results$slopes, "estimate"), sqrt(diag(vcov(within))))
}

compare_slopes <- function(panel, results) {
  specification <- results$specification
  within <- package_fit(panel, specification$effects)
  estimate <- unname(coef(within))
  if (specification$slopes == "wild") return(compare_wild(panel, results, estimate))
  covariance <- covariance_of(panel, specification$effects, specification$slopes)
  error <- sqrt(diag(covariance$v))
  interval <- t_interval(estimate, error, covariance$df, specification$confidence)
  theirs <- results$slopes
  has_interval <- !vapply(field(theirs, "standardError"), is.null, TRUE)
  only <- function(values) ifelse(has_interval, values, NA)
  rbind(
    difference_of("slopes", estimate, field(theirs, "estimate"), error),
    if (!is.null(results$slopeCovariance) && all(has_interval)) {
      sizes <- outer(error, error)
      difference_of("covariance of the slopes", covariance$v, unlist(results$slopeCovariance), sizes)
    },
    difference_of("standard errors of the slopes", only(error), field(theirs, "standardError")),
    difference_of("degrees of freedom", only(rep_len(covariance$df, length(error))), field(theirs, "degreesOfFreedom")),
    difference_of("t statistics", only(estimate / error), field(theirs, "statistic"), 1),
    difference_of("p values of the slopes", only(2 * pt(-abs(estimate / error), covariance$df)), field(theirs, "pValue"), 1e-12),
    difference_of("ends of the slopes' intervals",
      c(only(interval$low), only(interval$high)), c(field(theirs, "low"), field(theirs, "high")), rep(error, 2))
  )
}

compare_wild <- function(panel, results, estimate) {
  effects <- results$specification$effects
  theirs <- results$slopes
  error <- sqrt(diag(covariance_of(panel, effects, "cr0")$v))
  table <- rbind(
    difference_of("slopes", estimate, field(theirs, "estimate"), error),
    difference_of("cr0 standard errors", error, field(theirs, "standardError")),
    difference_of("cr0 t statistics", estimate / error, field(theirs, "statistic"), 1)
  )
  if (length(panel$companies) > 12) {
    cat("Wild bootstrap by random draws: the draws come from a generator of the application's own, so p values and\n",
      "interval ends are not recomputed here; the t statistics that they start from are.\n", sep = "")
    return(table)
  }
  p <- numeric()
  ends <- NULL
  for (slope in seq_along(estimate)) {
    p_of <- wild_p_value(panel, effects, slope)
    p[slope] <- p_of(0)
    # With so few sign vectors that no p value falls below alpha, no end exists.
    ends <- rbind(ends, wild_interval(p_of, estimate[slope], error[slope], results$specification$confidence))
  }
  rbind(table,
    difference_of("p values, all sign vectors", p, field(theirs, "pValue")),
    difference_of("ends of the bootstrap intervals", ends, c(field(theirs, "low"), field(theirs, "high")), rep(error, 2)))
}

compare_intercepts <- function(fit, results, code_of) {
  confidence <- results$specification$confidence
  companies <- fit$panel$companies
  theirs <- results$intercepts[match(companies, code_of(vapply(results$intercepts, function(entry) entry$company, "")))]
  weights <- diag(length(fit$beta))[, seq_along(companies), drop = FALSE]
  has_interval <- !vapply(field(theirs, "standardError"), is.null, TRUE)
  cosines <- interval_cosines(length(fit$panel$years))
  error <- rep(NA_real_, length(companies))
  if (any(has_interval)) {
    calibrated <- calibrated_error(fit, weights, cosines, fit$persistence$used)
    error <- calibrated$standard_error
    cosines <- calibrated$cosines
  }
  error[!has_interval] <- NA
  interval <- t_interval(unname(fit$intercepts), error, cosines, confidence)
  scale <- ifelse(is.na(error), max(abs(fit$intercepts)), error)
  rbind(
    difference_of("intercepts", interval$estimate, field(theirs, "estimate"), scale),
    difference_of("intercepts less their mean", fit$intercepts - mean(fit$intercepts), field(theirs, "deviation"), scale),
    difference_of("standard errors of the intercepts", error, field(theirs, "standardError")),
    difference_of("ends of the intercepts' intervals",
      c(interval$low, interval$high), c(field(theirs, "low"), field(theirs, "high")), rep(scale, 2)),
    if (!is.null(results$yearEffects)) {
      difference_of("year effects", fit$year_effects, field(results$yearEffects, "estimate"), max(abs(fit$year_effects)))
    }
  )
}

# Companies with a single row: y - x'b less the effect of its year, where the sample has that year.
compare_single_rows <- function(fit, singles, results, code_of) {
  theirs <- Filter(function(entry) entry$rows == 1, results$intercepts)
  if (length(theirs) == 0) return(NULL)
  places <- match(code_of(vapply(theirs, function(entry) entry$company, "")), singles$company)
  if (anyNA(places)) {
    cat("rows.csv does not hold the rows of companies with a single row; their intercepts are not recomputed.\n")
    return(NULL)
  }
  year <- if (is.null(fit$year_effects)) 0 else fit$year_effects[match(singles$year, fit$panel$years)]
  ours <- singles$y - drop(singles$x %*% fit$slopes) - ifelse(is.na(year), 0, year)
  difference_of("intercepts of single rows", ours[places], field(theirs, "estimate"), max(abs(fit$intercepts)))
}

compare_standing <- function(fit, results, code_of) {
  theirs <- results$standing
  if (is.null(theirs)) return(NULL)
  own <- code_of(theirs$company)
  cosines <- interval_cosines(length(fit$panel$years))
  has_interval <- !is.null(theirs$standardError)
  weights <- standing_weights(fit, own)
  estimate <- sum(weights * fit$beta)
  error <- list(standard_error = NA, calibration = NA, cosines = cosines)
  if (has_interval) error <- calibrated_error(fit, weights, cosines, fit$persistence$used)
  interval <- t_interval(estimate, error$standard_error, error$cosines, results$specification$confidence)
  scale <- if (has_interval) error$standard_error else max(abs(fit$intercepts))
  rbind(
    difference_of("standing", estimate, theirs["estimate"], scale),
    difference_of("standard error of the standing", error$standard_error, theirs["standardError"]),
    difference_of("ends of the standing's interval", c(interval$low, interval$high), theirs[c("low", "high")], scale),
    difference_of("persistence, pooled and own",
      c(fit$persistence$pooled, fit$persistence$own[[own]]), list(theirs$persistence, theirs$ownPersistence), 1),
    difference_of("calibration", error$calibration, list(theirs$calibration)),
    if (!is.null(theirs$rankSet)) {
      set <- rank_set_of(fit, own, fit$persistence$used, results$specification$confidence)
      difference_of("rank and rank set", c(set$rank, set$rank_set), c(theirs$rank, unlist(theirs$rankSet)))
    }
  )
}

compare_poolability <- function(panel, results) {
  theirs <- results$poolability
  if (is.null(theirs$value)) return(NULL)
  ours <- poolability_of(panel, results$specification$effects)
  rbind(
    difference_of("poolability F", ours$value, theirs$value),
    difference_of("poolability degrees of freedom", c(ours$df1, ours$df2), c(theirs$df1, theirs$df2)),
    difference_of("poolability p value", ours$p, theirs["pValue"], 1e-300)
  )
}

# Recomputes the fit in a folder. Returns the table of differences.
replicate_fit <- function(folder = ".") {
  results <- jsonlite::fromJSON(file.path(folder, "results.json"), simplifyVector = FALSE)$result
  read <- read_rows(file.path(folder, "rows.csv"), results)
  all_rows <- read$panel
  rows <- table(all_rows$company)
  panel <- keep_rows(all_rows, rows[all_rows$company] > 1)
  singles <- keep_rows(all_rows, rows[all_rows$company] == 1)
  effects <- results$specification$effects
  cells <- length(panel$y) * (length(panel$companies) + length(panel$years) + ncol(panel$x))
  if (cells > largest_dense_design) {
    cat("The full dummy regression of this fit has ", cells, " cells; only its slopes are recomputed, with their covariance\n",
      "unless that needs the leverages of the full regression.\n", sep = "")
    if (startsWith(results$specification$slopes, "hc")) return(compare_estimates(panel, results))
    return(compare_slopes(panel, results))
  }
  fit <- dummy_fit(panel, effects)
  fit$persistence <- persistence_of(panel, fit$residuals)
  rbind(
    compare_slopes(panel, results),
    compare_intercepts(fit, results, read$code_of),
    compare_single_rows(fit, singles, results, read$code_of),
    compare_standing(fit, results, read$code_of),
    compare_poolability(panel, results)
  )
}

# Prints the table. Returns the exit status.
report_fit <- function(folder = ".") {
  suppressMessages(for (name in c("plm", "sandwich", "clubSandwich", "jsonlite")) loadNamespace(name))
  table <- replicate_fit(folder)
  table <- table[table$numbers > 0, ]
  cat(sprintf("%-36s %8s  %s\n", "figure", "numbers", "relative difference"))
  cat(sprintf("%-36s %8d  %.2e\n", table$figure, table$numbers, table$difference), sep = "")
  largest <- max(table$difference)
  cat(sprintf("largest relative difference: %.2e (%s); allowed %.0e\n", largest, table$figure[which.max(table$difference)], tolerance))
  if (largest > tolerance) 1 else 0
}

if (sys.nframe() == 0) quit(status = report_fit())
