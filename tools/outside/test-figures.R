# Tests of the model with company effects: statistic and p value each.

test_figures <- function(panel) {
  frame <- plm::pdata.frame(package_frame(panel), c("company", "year"))
  formula <- model_formula(panel)
  within <- plm::plm(formula, frame, model = "within")
  pooling <- plm::plm(formula, frame, model = "pooling")
  lsdv <- full_lm(panel, "company")
  company <- factor(panel$company, panel$companies)
  e <- unname(residuals(lsdv))
  of <- function(call, test) try_figure(call, function() {
    result <- test()
    figure(call, c(result$statistic, result$p.value))
  })
  list(
    `test.slope-homogeneity` = of("plm::pooltest(within, pvcm)", function() plm::pooltest(within, plm::pvcm(formula, frame, model = "within"))),
    `test.hausman-classical` = of("plm::phtest(within, swar)", function() {
      random <- plm::plm(formula, frame, model = "random", random.method = "swar")
      gap <- vcov(within) - vcov(random)[names(coef(within)), names(coef(within))]
      if (any(eigen(gap, symmetric = TRUE)$values <= 0)) stop("the difference of the covariances is not positive definite")
      plm::phtest(within, random)
    }),
    `test.hausman-clustered` = of("clubSandwich::Wald_test(lm with company means, constrain_zero, 'CR2', test = 'HTZ')", function() mundlak_test(panel)),
    `test.breusch-pagan-lm` = of("plm::plmtest(type = 'bp')", function() plm::plmtest(pooling, effect = "individual", type = "bp")),
    `test.honda` = of("plm::plmtest(type = 'honda')", function() plm::plmtest(pooling, effect = "individual", type = "honda")),
    `test.wooldridge-within` = of("plm::pwartest(within), p from F(1, N - 1)", function() {
      statistic <- plm::pwartest(within)$statistic
      list(statistic = statistic, p.value = pf(statistic, 1, nlevels(company) - 1, lower.tail = FALSE))
    }),
    `test.wooldridge-first-differences` = of("plm::pwfdtest(h0 = 'fe')", function() plm::pwfdtest(formula, data = frame, h0 = "fe")),
    `test.breusch-godfrey` = of("plm::pbgtest(within, order = 1)", function() plm::pbgtest(within, order = 1)),
    `test.durbin-watson` = of("plm::pbnftest(test = 'bnf')", function() plm::pbnftest(within, test = "bnf")),
    `test.pesaran-cd` = of("pairs with 3 common years or more, own code", function() pesaran_test(panel, e)),
    `test.brown-forsythe` = of("car::leveneTest(e, company, center = median)", function() {
      result <- car::leveneTest(e, company, center = median)
      list(statistic = result[["F value"]][1], p.value = result[["Pr(>F)"]][1])
    }),
    `test.modified-wald` = of("by its definition in words, own code", function() modified_wald_test(company, e)),
    `test.reset` = of("lmtest::resettest(lsdv, power = 2, type = 'fitted')", function() lmtest::resettest(lsdv, power = 2, type = "fitted"))
  )
}

mundlak_test <- function(panel) {
  regressors <- ncol(panel$x)
  x <- sweep(panel$x, 2, colMeans(panel$x)) # which moves only the constant, and keeps the package's digits
  means <- apply(x, 2, function(column) ave(column, panel$company))
  model <- lm(panel$y ~ cbind(x, means))
  result <- clubSandwich::Wald_test(model, clubSandwich::constrain_zero(1 + regressors + seq_len(regressors)),
    vcov = "CR2", cluster = match(panel$company, panel$companies), test = "HTZ")
  list(statistic = result$Fstat, p.value = result$p_val)
}

pesaran_test <- function(panel, e) {
  companies <- panel$companies
  wide <- matrix(NA, length(panel$years), length(companies))
  wide[cbind(panel$position, match(panel$company, companies))] <- e
  total <- 0
  pairs <- 0
  for (i in seq_len(length(companies) - 1)) for (j in (i + 1):length(companies)) {
    both <- !is.na(wide[, i]) & !is.na(wide[, j])
    if (sum(both) < 3) next
    total <- total + sqrt(sum(both)) * cor(wide[both, i], wide[both, j])
    pairs <- pairs + 1
  }
  statistic <- total / sqrt(pairs)
  list(statistic = statistic, p.value = 2 * pnorm(-abs(statistic)))
}

# Greene's statistic for unequal variances of companies; only where every company has 5 rows.
modified_wald_test <- function(company, e) {
  rows <- as.numeric(table(company))
  if (any(rows < 5)) stop("a company has fewer than 5 rows")
  variance <- tapply(e^2, company, mean)
  spread <- tapply(seq_along(e), company, function(at) sum((e[at]^2 - mean(e[at]^2))^2)) / (rows * (rows - 1))
  statistic <- sum((variance - mean(e^2))^2 / spread)
  list(statistic = statistic, p.value = pchisq(statistic, length(rows), lower.tail = FALSE))
}

diagnostic_figures <- function(panel, effects) {
  full <- full_lm(panel, effects)
  columns <- demeaned_design(panel, effects)
  design <- columns$u[, columns$slopes, drop = FALSE]
  if (effects == "company,year") design <- qr.resid(qr(columns$u[, -columns$slopes]), design)
  inflation <- vapply(seq_len(ncol(design)), function(k) {
    if (ncol(design) == 1) return(1)
    sum(design[, k]^2) / sum(qr.resid(qr(design[, -k, drop = FALSE]), design[, k])^2)
  }, 0)
  leverage <- unname(hatvalues(full))
  certain <- leverage > 1 - 1e-10
  unless <- function(values) ifelse(certain, NA, unname(values))
  studentised <- unless(rstudent(full))
  cook <- unless(cooks.distance(full))
  # The whole of a large sample is no golden number: the 20 largest by studentised residual, largest first.
  largest <- head(order(-abs(studentised)), 20)
  list(
    varianceInflation = figure("1/(1 - R2) of the regressors less the effects", inflation),
    leverages = figure("hatvalues(lsdv), of the 20 largest studentised", leverage[largest]),
    studentised = figure("rstudent(lsdv), the 20 largest", studentised[largest]),
    cook = figure("cooks.distance(lsdv), of the 20 largest studentised", cook[largest])
  )
}
