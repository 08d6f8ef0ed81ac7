/** What a column is to the model. */
export type ModelRole = 'marketValue' | 'capex' | 'bookEquity';
