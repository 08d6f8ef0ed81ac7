# What the panels' own JSON files lack of the tests: the tests of the model with company and year effects,
# Pesaran's CD over pairs with three common years or more, and Wooldridge's p value from companies, per golden panel.
# From the project's root: Rscript tools/reference/panel_tests.R
# Needs jsonlite, plm and lmtest (Debian: r-cran-jsonlite, r-cran-plm, r-cran-lmtest).

suppressMessages({library(plm); library(lmtest)})

panels <- c("grunfeld10", "grunfeld11", "grunfeld11_value_on_inv_capital", "grunfeld10_unbalanced",
            "grunfeld10_loglog", "usairlines", "instinnovation120")
folder <- "backend/stats/golden"

plain <- function(test, call) {
  Filter(length, list(call = call, statistic = unname(test$statistic), parameter = as.list(test$parameter),
                      p_value = unname(test$p.value)))
}

modified_wald <- function(residuals, company) {
  squares <- residuals^2
  size <- tapply(squares, company, length)
  if (min(size) < 5) return(NULL)
  mean_square <- tapply(squares, company, mean)
  variance <- tapply(squares, company, function(s) sum((s - mean(s))^2)) / (size * (size - 1))
  list(call = "by hand as in the panels' own blocks, e = residuals(lm(y ~ company + factor(year) + x))",
       statistic = sum((mean_square - mean(squares))^2 / variance), parameter = list(df = length(size)))
}

# Correlations of each pair over its common years, pairs with fewer than three left out.
cd_three_years <- function(residuals, company, year) {
  wide <- tapply(residuals, list(year, company), sum)
  common <- crossprod(!is.na(wide))
  correlation <- suppressWarnings(cor(wide, use = "pairwise.complete.obs"))
  kept <- lower.tri(common) & common >= 3
  statistic <- sum((sqrt(common) * correlation)[kept]) / sqrt(sum(kept))
  list(call = "sqrt(1/pairs) * sum(sqrt(T_ij) * cor_ij) over pairs with T_ij >= 3, cor(use = 'pairwise.complete.obs')",
       statistic = statistic, pairs = sum(kept), p_value = 2 * pnorm(-abs(statistic)))
}

# Numbers with 17 significant digits, which read back to the same double; jsonlite alone stops at 15.
exactly <- function(values) rapply(values, function(value) structure(sprintf("%.17g", value), class = "json"),
                                   classes = c("numeric", "integer"), how = "replace")

results <- list()
for (panel in panels) {
  meta <- jsonlite::fromJSON(file.path(folder, paste0(panel, ".json")))$meta
  rows <- read.csv(file.path(folder, paste0(panel, ".csv")))
  rows$company <- factor(rows$company)
  within <- plm(reformulate(meta$regressors, meta$dependent), pdata.frame(rows, index = c("company", "year")),
                model = "within", effect = "twoways")
  dummies <- lm(reformulate(c("company", "factor(year)", meta$regressors), meta$dependent), rows)
  companies <- lm(reformulate(c("company", meta$regressors), meta$dependent), rows)
  demeaned <- sapply(meta$regressors, function(name)
    residuals(lm(reformulate(c("company", "factor(year)"), name), rows)))
  vif <- sapply(meta$regressors, function(name) {
    others <- setdiff(meta$regressors, name)
    rest <- lm.fit(demeaned[, others, drop = FALSE], demeaned[, name])$residuals
    sum(demeaned[, name]^2) / sum(rest^2)
  })
  one_way <- pwartest(plm(reformulate(meta$regressors, meta$dependent), pdata.frame(rows, index = c("company", "year")),
                          model = "within"))
  results[[panel]] <- Filter(length, list(
    wooldridge_within_companies = list(
      call = "s <- pwartest(plm(f, model = 'within'))$statistic; pf(s, 1, N - 1, lower.tail = FALSE)",
      statistic = unname(one_way$statistic), parameter = list(df1 = 1, df2 = nlevels(rows$company) - 1),
      p_value = unname(pf(one_way$statistic, 1, nlevels(rows$company) - 1, lower.tail = FALSE))),
    wooldridge_within_years = plain(pwartest(within), "pwartest(plm(f, model = 'within', effect = 'twoways'))"),
    breusch_godfrey_years = plain(pbgtest(within, order = 1), "pbgtest(plm(f, model = 'within', effect = 'twoways'), order = 1)"),
    bhargava_dw_years = plain(pbnftest(within, test = "bnf"), "pbnftest(plm(f, model = 'within', effect = 'twoways'), test = 'bnf')"),
    modified_wald_years = modified_wald(residuals(dummies), rows$company),
    reset_power2_years = plain(resettest(dummies, power = 2, type = "fitted"),
      "lmtest::resettest(lm(y ~ company + factor(year) + x), power = 2, type = 'fitted')"),
    pesaran_cd_three_years = cd_three_years(residuals(companies), rows$company, rows$year),
    vif_within_years = list(call = "1/(1-R2_j) of the regressors less company and year effects", values = as.list(vif)),
    influence_years = list(call = "hatvalues, rstandard, rstudent, cooks.distance of lm(y ~ company + factor(year) + x), 10 largest by Cook's distance",
      rows = {
        table <- data.frame(row = seq_len(nrow(rows)), leverage = hatvalues(dummies), rstandard = rstandard(dummies),
                            rstudent = rstudent(dummies), cooks = cooks.distance(dummies))
        lapply(order(-table$cooks)[1:10], function(row) as.list(table[row, ]))
      })))
}

meta <- list(R = R.version.string, packages = list(
  plm = as.character(packageVersion("plm")), lmtest = as.character(packageVersion("lmtest"))))
writeLines(jsonlite::toJSON(list(meta = meta, panels = exactly(results)), auto_unbox = TRUE, json_verbatim = TRUE, pretty = TRUE),
           file.path(folder, "panel-tests.json"))
