// The t distribution asks `@stdlib/assert-has-generator-support` whether the browser knows generators; that package
// asks by `eval`, which the content security policy reports as a violation. angular.json puts this in its place.
module.exports = () => true;
