# Estimators beside the fixed effects for which the golden panels' own blocks hold no result: pooled standard errors,
# first differences over consecutive calendar years (without and with year effects), and random effects with year effects.
# Run from the project's root: Rscript tools/reference/estimators.R
# Writes backend/stats/golden/estimators.json.

suppressMessages(library(plm))

folder <- "backend/stats/golden"
models <- list(
  grunfeld10 = list("inv", c("value", "capital")),
  grunfeld10_unbalanced = list("inv", c("value", "capital")),
  usairlines = list("log_cost", c("log_output", "log_price", "load")),
  instinnovation120 = list("log_value", c("log_sales", "log_capital"))
)
number <- function(value) formatC(value, digits = 17, format = "g", width = 1)
named <- function(values, names) {
  paste0("{ ", paste0("\"", names, "\": ", number(values[names]), collapse = ", "), " }")
}

# The slopes of a fit, their standard errors and further members, as one JSON block.
block <- function(call, fit, regressors, more = character(0)) {
  members <- c(
    paste0("\"call\": \"", call, "\""),
    paste0("\"coef\": ", named(coef(fit), regressors)),
    paste0("\"se\": ", named(sqrt(diag(vcov(fit))), regressors)),
    more
  )
  paste0("{\n      ", paste(members, collapse = ",\n      "), "\n    }")
}
whole <- function(name, value) paste0("\"", name, "\": ", value)

# Changes from one calendar year to the next, company by company.
changes <- function(data, columns) {
  data <- data[order(data$company, data$year), ]
  later <- which(c(FALSE, diff(data$year) == 1 & tail(data$company, -1) == head(data$company, -1)))
  result <- data[later, columns] - data[later - 1, columns]
  result$year <- factor(data$year[later])
  result
}

# Swamy and Arora's estimator by its quadratic forms, projections written out.
by_definition <- function(formula, data) {
  design <- model.matrix(formula, data)
  outcome <- model.response(model.frame(formula, data))
  company <- factor(data$company)
  members <- model.matrix(~ company - 1)
  mean_of <- function(v) ave(v, company)
  within <- lm.fit(cbind(members, design[, -1]), outcome)
  idios <- sum(within$residuals^2) / (nrow(design) - within$rank)
  between <- qr(apply(design, 2, mean_of))
  residual <- qr.resid(between, mean_of(outcome))
  trace <- sum(qr.fitted(between, members) * members)
  id <- (sum(residual^2) - idios * (ncol(members) - between$rank)) / (nrow(design) - trace)
  theta <- 1 - (1 + ave(outcome, company, FUN = length) * id / idios)^(-1 / 2)
  transformed <- design - theta * apply(design, 2, mean_of)
  fit <- lm(y ~ . - 1, data.frame(y = outcome - theta * mean_of(outcome), transformed))
  list(fit = fit, sigma2 = c(idios = idios, id = id))
}

panels <- vapply(names(models), function(name) {
  data <- read.csv(file.path(folder, paste0(name, ".csv")))
  outcome <- models[[name]][[1]]
  x <- models[[name]][[2]]
  differences <- changes(data, c(outcome, x))
  pooled <- lm(reformulate(x, outcome), data)
  calendar <- lm(reformulate(x, outcome, intercept = FALSE), differences)
  years <- lm(reformulate(c(x, "year"), outcome, intercept = FALSE), differences)
  blocks <- c(
    pooled = block("lm(y ~ x)", pooled, x),
    calendar_differences = block(
      "lm(dy ~ dx - 1), dy and dx over consecutive calendar years of a company", calendar, x,
      c(whole("df", calendar$df.residual), whole("observations", nrow(differences)))
    ),
    calendar_differences_years = block(
      "lm(dy ~ dx + factor(year) - 1), consecutive calendar years", years, x,
      whole("df", years$df.residual)
    )
  )
  # Where the companies' means leave some year undetermined plm stops, so there the definition is written out.
  data$year <- factor(data$year)
  formula <- reformulate(c(x, "year"), outcome)
  if (name == "grunfeld10_unbalanced") {
    random <- by_definition(formula, data)
    call <- "by definition: Swamy-Arora quadratic forms with projections (rank for columns), lm of y - theta*ave(y, company)"
    fit <- random$fit
    sigma2 <- random$sigma2
  } else {
    call <- "plm(y ~ x + factor(year), model='random', random.method='swar')"
    fit <- plm(
      formula, pdata.frame(data, c("company", "year")),
      model = "random", random.method = "swar"
    )
    sigma2 <- fit$ercomp$sigma2
  }
  blocks <- c(blocks, random_swar_years = block(call, fit, x, c(
    whole("sigma2_idios", number(sigma2[["idios"]])),
    whole("sigma2_company", number(sigma2[["id"]]))
  )))
  paste0(
    "  \"", name, "\": {\n",
    paste0("    \"", names(blocks), "\": ", blocks, collapse = ",\n"),
    "\n  }"
  )
}, "")

versions <- paste0(
  "  \"versions\": { \"R\": \"", R.version.string, "\", \"plm\": \"",
  as.character(packageVersion("plm")), "\" }"
)
writeLines(
  paste0("{\n", paste(c(versions, panels), collapse = ",\n"), "\n}"),
  file.path(folder, "estimators.json")
)
