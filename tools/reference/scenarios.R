# Differences of scenarios, the peers' spread and what one regressor moves over it, from the full dummy regression.
# Clustered contrasts of slopes by clubSandwich, percentiles by stats::quantile(type = 7); the calibrated interval by the
# replication pack's code. From the project's root: Rscript tools/reference/scenarios.R
# Needs jsonlite and clubSandwich. Writes backend/stats/golden/scenarios.json.

root <- getwd()
source(file.path(root, "backend/fits/replication/replication.R"), encoding = "UTF-8")
for (part in c("read-case", "prediction-figures")) source(file.path(root, "tools/outside", paste0(part, ".R")), encoding = "UTF-8")

golden <- "backend/stats/golden"
unbalanced <- list(file = "grunfeld10_unbalanced.csv", outcome = "inv", regressors = c("value", "capital"))
corrected <- list(file = "grunfeld11_value_on_inv_capital.csv", outcome = "value", regressors = c("inv", "capital"))
cases <- list(
  c(corrected, own = "C06", effects = "company", form = "levels", lag = 0, confidence = 0.95),
  c(unbalanced, own = "F07", effects = "company,year", form = "levels", lag = 0, confidence = 0.9),
  c(unbalanced, own = "F05", effects = "company,year", form = "log", lag = 1, confidence = 0.95)
)

figures_of <- function(case) {
  panel <- read_case(modifyList(case, list(file = file.path(golden, case$file), company = "company", year = "year")), root)
  fit <- dummy_fit(panel, case$effects)
  rho <- persistence_of(panel, fit$residuals)$used
  own <- case$own
  at <- which(panel$company == own)
  last <- at[length(at)]
  scale_of <- if (case$form == "log") log else identity
  measured <- if (case$form == "log") panel$levels else panel
  smear <- if (case$form == "log") mean(exp(fit$residuals)) else NA
  base <- measured$x[last, ]
  plans <- list(left = base * c(1.2, 1.1), right = base * c(0.9, 1.3))
  has_years <- case$effects == "company,year"
  coded <- contr.sum(length(panel$years))
  given <- if (case$form == "log") 0.04 else 30
  other <- if (case$form == "log") -0.02 else 5

  # Weights over the full regression's coefficients, and what is known beside them.
  contrast_of <- function(x, h, start, choice) {
    share <- if (start == "carry-the-gap") rho[[own]]^h else 0
    w <- company_weights(fit, setNames(1 - share, own))
    w[fit$slope_places] <- scale_of(x) - share * panel$x[last, ]
    constant <- share * panel$y[last]
    if (has_years) {
      if (is.list(choice)) constant <- constant + choice$given
      else w[fit$year_places] <- if (choice == "last") coded[length(panel$years), ] else colMeans(tail(coded, 3))
      w[fit$year_places] <- w[fit$year_places] - share * coded[panel$position[last], ]
    }
    if (!is.na(smear) && start == "model-level") constant <- constant + log(smear)
    list(w = w, constant = constant)
  }
  slope_interval <- function(x, constant) {
    design <- demeaned_design(panel, case$effects)
    regression <- lm(design$y ~ 0 + design$u)
    contrast <- numeric(ncol(design$u))
    contrast[design$slopes] <- x
    found <- clubSandwich::linear_contrast(regression, vcov = "CR2", cluster = match(panel$company, panel$companies),
      contrasts = matrix(contrast, 1), level = case$confidence, test = "Satterthwaite")
    list(estimate = found$Est + constant, standardError = found$SE, low = found$CI_L + constant, high = found$CI_U + constant)
  }
  difference_of <- function(h, left, right) {
    a <- contrast_of(plans$left, h, left$start, left$yearEffect)
    b <- contrast_of(plans$right, h, right$start, right$yearEffect)
    w <- a$w - b$w
    constant <- a$constant - b$constant
    alone <- all(abs(w[-fit$slope_places]) < 1e-12)
    interval <- if (alone) slope_interval(w[fit$slope_places], constant) else {
      found <- calibrated_error(fit, w, interval_cosines(length(panel$years)), rho,
        contrast_clocks(fit, company_weights(fit, setNames(1, own)), interval_cosines(length(panel$years))))
      t_interval(sum(w * fit$beta) + constant, drop(found$standard_error), found$cosines, case$confidence)
    }
    c(list(year = panel$year[last] + h, left = left, right = right, kind = if (alone) "slopes" else "calibrated"), interval)
  }
  look <- function(start, yearEffect = "last") list(start = start, yearEffect = yearEffect)
  level <- look("model-level")
  carried <- look("carry-the-gap")
  pairs <- list(list(level, level), list(carried, carried), list(level, carried), list(carried, level))
  if (has_years) pairs <- c(pairs, list(
    list(look("model-level", "mean-of-last-three"), level),
    list(look("carry-the-gap", "mean-of-last-three"), level),
    list(look("model-level", list(given = given)), level),
    list(look("model-level", list(given = given)), look("model-level", list(given = other)))
  ))
  differences <- unlist(lapply(c(1, 3), function(h) lapply(pairs, function(pair) difference_of(h, pair[[1]], pair[[2]]))), recursive = FALSE)

  peers <- panel$company != own
  spread <- lapply(seq_along(case$regressors), function(k) {
    ends <- quantile(measured$x[peers, k], c(0.1, 0.9), type = 7, names = FALSE)
    list(low = ends[1], high = ends[2])
  })
  moves <- lapply(seq_along(case$regressors), function(k) {
    change <- numeric(length(case$regressors))
    change[k] <- diff(scale_of(unlist(spread[[k]])))
    expected <- lapply(spread[[k]], function(value) {
      found <- contrast_of(replace(plans$left, k, value), 2, "model-level", "last")
      error <- calibrated_error(fit, found$w, interval_cosines(length(panel$years)), rho)
      interval <- t_interval(sum(found$w * fit$beta), error$standard_error, error$cosines, case$confidence)
      ends <- c(estimate = interval$estimate, low = interval$low, high = interval$high)
      as.list(if (is.na(smear)) ends else exp(ends) * smear)
    })
    list(regressor = k - 1, expected = expected, change = slope_interval(change, 0))
  })
  specification <- case[c("effects", "form", "lag", "confidence")]
  list(file = case$file, outcome = case$outcome, regressors = case$regressors, own = own, specification = specification,
    plans = lapply(plans, unname), differences = differences, peerSpread = spread,
    sensitivity = list(year = panel$year[last] + 2, moves = moves))
}

# Numbers with 17 significant digits, which read back to the same double; jsonlite alone stops at 15.
exactly <- function(values) rapply(values, function(value) {
  digits <- sprintf("%.17g", value)
  structure(if (length(value) == 1) digits else paste0("[", paste(digits, collapse = ", "), "]"), class = "json")
}, classes = c("numeric", "integer"), how = "replace")

about <- paste0("tools/reference/scenarios.R, ", R.version.string, ", clubSandwich ", packageVersion("clubSandwich"))
text <- jsonlite::toJSON(list(about = about, cases = lapply(cases, function(case) exactly(figures_of(case)))),
  auto_unbox = TRUE, json_verbatim = TRUE, pretty = TRUE)
writeLines(text, file.path(golden, "scenarios.json"))
