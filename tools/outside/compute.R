# Rscript tools/outside/compute.R REQUEST.json RESULT.json: every figure of every case by public packages and by the
# code beside this file. One process for all, because loading the packages takes longer than most cases.

suppressPackageStartupMessages({
  library(plm)
  library(clubSandwich)
})
arguments <- commandArgs(trailingOnly = TRUE)
root <- getwd()
source(file.path(root, "backend/fits/replication/replication.R"), encoding = "UTF-8")
for (part in c("read-case", "fit-figures", "standing-figures", "estimator-figures", "test-figures", "prediction-figures")) {
  source(file.path(root, "tools/outside", paste0(part, ".R")), encoding = "UTF-8")
}

case_figures <- function(case) {
  panel <- read_case(case, root)
  fit <- dummy_fit(panel, case$effects)
  fit$persistence <- persistence_of(panel, fit$residuals)
  slopes <- unname(coef(package_fit(panel, case$effects)))
  prediction <- prediction_figures(panel, fit, case)
  figures <- c(
    fit_figures(panel, fit, case$effects),
    covariance_figures(panel, case$effects, slopes, case$confidence),
    list(covariance.wild = wild_figure(panel, case$effects, slopes, case$confidence)),
    standing_figures(panel, fit, case),
    diagnostic_figures(panel, case$effects),
    prediction$figures,
    if (case$effects == "company") c(estimator_figures(panel), test_figures(panel))
  )
  list(id = case$id, observations = length(panel$y), plans = lapply(prediction$plans, exact_json), figures = Filter(Negate(is.null), figures))
}

versions <- vapply(c("plm", "sandwich", "clubSandwich", "lmtest", "car", "jsonlite"), function(name) as.character(packageVersion(name)), "")
request <- jsonlite::fromJSON(arguments[1], simplifyVector = FALSE)
results <- lapply(request, function(case) {
  begun <- proc.time()[["elapsed"]]
  result <- case_figures(case)
  message(case$id, ": ", round(proc.time()[["elapsed"]] - begun, 1), " s")
  result
})
answer <- list(r = paste(R.version$major, R.version$minor, sep = "."), packages = as.list(versions), cases = results)
writeLines(jsonlite::toJSON(answer, auto_unbox = TRUE, json_verbatim = TRUE), arguments[2])
