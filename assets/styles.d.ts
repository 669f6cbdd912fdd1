// Metro bundles a style sheet that is imported for its effect; TypeScript only needs to know that it may be.
declare module '*.css';
