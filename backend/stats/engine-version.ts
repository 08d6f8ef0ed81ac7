/** Version of the computations: raised whenever any figure of any fit could change or one is added. Part of every fit’s hash. */
export const engineVersion = '2.2.0';
