# Brown and Forsythe's test of equal variances on the residuals of the dummy regression, per golden panel, with company
# effects and with company and year effects. From the project's root: Rscript tools/reference/brown_forsythe.R
# Needs jsonlite and car (Debian: r-cran-jsonlite, r-cran-car).

suppressMessages(library(car))

panels <- c("grunfeld10", "grunfeld11", "grunfeld11_value_on_inv_capital", "grunfeld10_unbalanced",
            "grunfeld10_loglog", "usairlines", "instinnovation120")
folder <- "backend/stats/golden"

brown_forsythe <- function(residuals, company, call) {
  table <- car::leveneTest(residuals, company, center = median)
  list(call = call, statistic = table[1, "F value"],
       parameter = list(df1 = table[1, "Df"], df2 = table[2, "Df"]), p_value = table[1, "Pr(>F)"])
}

# Numbers with 17 significant digits, which read back to the same double; jsonlite alone stops at 15.
exactly <- function(values) rapply(values, function(value) structure(sprintf("%.17g", value), class = "json"),
                                   classes = c("numeric", "integer"), how = "replace")

results <- list()
for (panel in panels) {
  meta <- jsonlite::fromJSON(file.path(folder, paste0(panel, ".json")))$meta
  rows <- read.csv(file.path(folder, paste0(panel, ".csv")))
  rows$company <- factor(rows$company)
  plain <- lm(reformulate(c("company", meta$regressors), meta$dependent), rows)
  years <- lm(reformulate(c("company", "factor(year)", meta$regressors), meta$dependent), rows)
  results[[panel]] <- list(
    brown_forsythe = brown_forsythe(residuals(plain), rows$company,
      "car::leveneTest(residuals(lm(y ~ company + x)), company, center = median)"),
    brown_forsythe_years = brown_forsythe(residuals(years), rows$company,
      "car::leveneTest(residuals(lm(y ~ company + factor(year) + x)), company, center = median)"))
}

meta <- list(R = R.version.string, packages = list(car = as.character(packageVersion("car"))))
writeLines(jsonlite::toJSON(list(meta = meta, panels = exactly(results)), auto_unbox = TRUE, json_verbatim = TRUE, pretty = TRUE),
           file.path(folder, "brown-forsythe.json"))
