# Uncertain plans simulated in R: triangular inputs as mixtures of the larger of two uniform numbers, stats::rt for the
# market value, standard errors from the full dummy regression by the replication pack's code.
# From the project's root: Rscript tools/reference/uncertain_plan.R
# Needs jsonlite. Writes backend/stats/golden/uncertain-plan.json.

root <- getwd()
source(file.path(root, "backend/fits/replication/replication.R"), encoding = "UTF-8")
for (part in c("read-case", "prediction-figures")) source(file.path(root, "tools/outside", paste0(part, ".R")), encoding = "UTF-8")

golden <- "backend/stats/golden"
draws <- 1e6
percents <- c(5, 10, 25, 50, 75, 90, 95)
unbalanced <- list(file = "grunfeld10_unbalanced.csv", outcome = "inv", regressors = c("value", "capital"))
corrected <- list(file = "grunfeld11_value_on_inv_capital.csv", outcome = "value", regressors = c("inv", "capital"))
cases <- list(
  c(corrected, own = "C06", effects = "company", form = "levels", lag = 0, start = "model-level"),
  c(unbalanced, own = "F07", effects = "company,year", form = "levels", lag = 0, start = "carry-the-gap"),
  c(unbalanced, own = "F05", effects = "company,year", form = "log", lag = 1, start = "model-level"),
  c(unbalanced, own = "F03", effects = "company", form = "log", lag = 0, start = "carry-the-gap")
)

triangular <- function(low, likely, high) {
  larger <- pmax(runif(draws), runif(draws))
  ifelse(runif(draws) < (likely - low) / (high - low), low + (likely - low) * larger, high - (high - likely) * larger)
}

# lambda_j by contrast (B x P), A and D (P x P) of the contrasts in the columns of `w`; see calibrated_error.
forms_of <- function(fit, w, clocks, rho) {
  panel <- fit$panel
  years <- length(panel$years)
  g <- fit$q %*% backsolve(fit$r, w[fit$pivot, , drop = FALSE], transpose = TRUE)
  rows_of <- split(seq_along(panel$company), factor(panel$company, panel$companies))
  form <- function(values) Reduce(`+`, lapply(panel$companies, function(name) {
    rows <- rows_of[[name]]
    correlation <- rho[[name]]^abs(outer(panel$year[rows], panel$year[rows], "-"))
    crossprod(values[rows, , drop = FALSE], correlation %*% values[rows, , drop = FALSE])
  }))
  h <- lapply(seq_len(clocks$cosines), function(j) sqrt(2 / years) * cos(pi * j * clocks$places[panel$position, 1]) * g)
  list(
    lambda = t(vapply(h, function(one) drop(crossprod(one, fit$residuals)), numeric(ncol(w)))), a = form(g),
    d = Reduce(`+`, lapply(h, function(one) form(one - fit$q %*% crossprod(fit$q, one)))) / length(h), years = years
  )
}

simulate <- function(case) {
  panel <- read_case(modifyList(case, list(file = file.path(golden, case$file), company = "company", year = "year")), root)
  fit <- dummy_fit(panel, case$effects)
  fit$persistence <- persistence_of(panel, fit$residuals)
  rho <- fit$persistence$used
  own <- case$own
  at <- which(panel$company == own)
  last <- at[length(at)]
  steps <- 2
  scale_of <- if (case$form == "log") log else identity
  measured <- if (case$form == "log") panel$levels else panel
  base <- measured$x[last, ]
  inputs <- list(list(low = 0.7 * base[1], likely = 0.9 * base[1], high = 1.8 * base[1]),
    list(low = 0.95 * base[2], likely = 1.3 * base[2], high = 1.4 * base[2]))
  share <- if (case$start == "carry-the-gap") rho[[own]]^steps else 0

  start <- company_weights(fit, setNames(1 - share, own))
  start[fit$slope_places] <- -share * panel$x[last, ]
  if (case$effects == "company,year") {
    coded <- contr.sum(length(panel$years))
    start[fit$year_places] <- coded[length(panel$years), ] - share * coded[panel$position[last], ]
  }
  units <- vapply(fit$slope_places, function(place) replace(numeric(length(fit$beta)), place, 1), numeric(length(fit$beta)))
  w <- cbind(start, units)
  clocks <- contrast_clocks(fit, company_weights(fit, setNames(1, own)), interval_cosines(length(panel$years)))
  forms <- forms_of(fit, w, clocks, rho)

  x <- cbind(1, vapply(inputs, function(input) scale_of(do.call(triangular, input)), numeric(draws)))
  point <- drop(x %*% crossprod(w, fit$beta)) + share * panel$y[last]
  quadratic <- function(m) rowSums((x %*% m) * x)
  squares <- rowMeans(tcrossprod(x, forms$lambda)^2)
  ratio <- quadratic(forms$a) / (forms$years * quadratic(forms$d))
  error <- forms$years * squares * pmax(1, ratio)
  spread <- spread_of(panel, fit, own, steps)
  ahead <- spread$s2 * (1 - spread$rho^(2 * steps))
  variance <- if (share > 0) ahead + error else pmax(spread$s2 * (1 - spread$overlap) + error, ahead)
  market <- point + sqrt(variance) * rt(draws, spread$df)
  if (case$form == "log") {
    market <- exp(market)
    point <- exp(point) * if (case$start == "model-level") mean(exp(fit$residuals)) else 1
  }
  fan <- function(values) {
    p <- percents / 100
    # 1/density by a difference of quantiles; the error of n draws is unit/sqrt(n).
    inverse <- (quantile(values, p + 0.005, names = FALSE) - quantile(values, p - 0.005, names = FALSE)) / 0.01
    list(percentiles = quantile(values, p, type = 7, names = FALSE), unitErrors = sqrt(p * (1 - p)) * inverse)
  }
  expected <- c(fan(point), list(mean = mean(point), meanUnitError = sd(point)))
  specification <- case[c("effects", "form", "lag")]
  list(file = case$file, outcome = case$outcome, regressors = case$regressors, own = own, specification = specification,
    start = case$start, year = panel$year[last] + steps, inputs = inputs, expected = expected, market = fan(market))
}

exactly <- function(values) rapply(values, function(value) {
  digits <- sprintf("%.17g", value)
  structure(if (length(value) == 1) digits else paste0("[", paste(digits, collapse = ", "), "]"), class = "json")
}, classes = c("numeric", "integer"), how = "replace")

set.seed(20, kind = "Mersenne-Twister")
about <- paste0("tools/reference/uncertain_plan.R, ", R.version.string, ", set.seed(20)")
results <- lapply(cases, function(case) exactly(simulate(case)))
text <- jsonlite::toJSON(list(about = about, draws = draws, cases = results), auto_unbox = TRUE, json_verbatim = TRUE, pretty = TRUE, digits = NA)
writeLines(text, file.path(golden, "uncertain-plan.json"))
