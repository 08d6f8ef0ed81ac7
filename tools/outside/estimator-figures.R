# The estimators that stand beside the fixed effects, classical.

estimator_figures <- function(panel) {
  frame <- plm::pdata.frame(package_frame(panel), c("company", "year"))
  formula <- model_formula(panel)
  with_errors <- function(call, model) {
    error <- sqrt(diag(vcov(model)))
    figure(call, c(coef(model), error[-1]), c(error, 0 * error[-1]))
  }
  between_call <- "plm(model = 'between')"
  random_call <- "plm(model = 'random', random.method = 'swar')"
  differences <- calendar_differences(panel)
  list(
    between = try_figure(between_call, function() with_errors(between_call, plm::plm(formula, frame, model = "between"))),
    randomEffects = try_figure(random_call, function() {
      with_errors(random_call, plm::plm(formula, frame, model = "random", random.method = "swar"))
    }),
    randomComponents = try_figure(random_call, function() {
      components <- plm::ercomp(plm::plm(formula, frame, model = "random", random.method = "swar"))
      theta <- if (is.list(components$theta)) components$theta$id else components$theta
      figure("plm::ercomp(): standard deviations of errors and companies, smallest and largest theta", c(sqrt(components$sigma2[c("idios", "id")]), range(theta)))
    }),
    firstDifferences = {
      model <- lm(differences$y ~ 0 + differences$x)
      error <- sqrt(diag(vcov(model)))
      figure("lm on differences of consecutive calendar years, no constant", c(coef(model), error, nobs(model)), c(error, 0 * error, 0))
    }
  )
}

calendar_differences <- function(panel) {
  n <- length(panel$y)
  at <- which(c(FALSE, panel$company[-1] == panel$company[-n] & diff(panel$year) == 1))
  list(y = panel$y[at] - panel$y[at - 1], x = panel$x[at, , drop = FALSE] - panel$x[at - 1, , drop = FALSE])
}
