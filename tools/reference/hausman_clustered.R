# The Hausman test in Mundlak's form with the bias-reduced covariance by company and the approximate Hotelling T²
# (Pustejovsky & Tipton 2018), by the R package clubSandwich, on every golden panel.
# Run from the project's root: Rscript tools/reference/hausman_clustered.R
# Writes backend/stats/golden/hausman-clustered.json.

suppressMessages(library(clubSandwich))

folder <- "backend/stats/golden"
models <- list(
  grunfeld10 = list("inv", c("value", "capital")),
  grunfeld11 = list("inv", c("value", "capital")),
  grunfeld10_unbalanced = list("inv", c("value", "capital")),
  grunfeld10_loglog = list("log_inv", c("log_value", "log_capital")),
  grunfeld11_value_on_inv_capital = list("value", c("inv", "capital")),
  usairlines = list("log_cost", c("log_output", "log_price", "load")),
  instinnovation120 = list("log_value", c("log_sales", "log_capital"))
)
call <- paste0(
  "m <- lm(y ~ x + ave(x, company)); Wald_test(m, constraints = constrain_zero(mean terms), ",
  "vcov = vcovCR(m, cluster = company, type = 'CR2'), test = 'HTZ')"
)
number <- function(value) formatC(value, digits = 17, format = "g", width = 1)

blocks <- vapply(names(models), function(name) {
  data <- read.csv(file.path(folder, paste0(name, ".csv")))
  outcome <- models[[name]][[1]]
  regressors <- models[[name]][[2]]
  # Distances from the overall mean change no mean term and keep the digits of the cross-products.
  for (column in regressors) data[[column]] <- data[[column]] - mean(data[[column]])
  means <- paste0(regressors, "_mean")
  for (k in seq_along(regressors)) data[[means[k]]] <- ave(data[[regressors[k]]], data$company)
  fit <- lm(reformulate(c(regressors, means), outcome), data)
  covariance <- vcovCR(fit, cluster = data$company, type = "CR2")
  terms <- match(means, names(coef(fit)))
  test <- Wald_test(fit, constraints = constrain_zero(terms), vcov = covariance, test = "HTZ")
  coefficients <- paste0("\"", means, "\": ", number(coef(fit)[means]), collapse = ", ")
  paste0(
    "  \"", name, "\": {\n",
    "    \"call\": \"", call, "\",\n",
    "    \"statistic\": ", number(test$Fstat), ",\n",
    "    \"parameter\": { \"df1\": ", number(test$df_num), ", \"df2\": ", number(test$df_denom), " },\n",
    "    \"p_value\": ", number(test$p_val), ",\n",
    "    \"coef\": { ", coefficients, " }\n",
    "  }"
  )
}, "")

versions <- paste0(
  "  \"versions\": { \"R\": \"", R.version.string, "\", \"clubSandwich\": \"",
  as.character(packageVersion("clubSandwich")), "\" }"
)
writeLines(
  paste0("{\n", paste(c(versions, blocks), collapse = ",\n"), "\n}"),
  file.path(folder, "hausman-clustered.json")
)
