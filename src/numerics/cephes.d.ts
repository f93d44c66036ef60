/** The few entries of the cephes package (special functions compiled to WebAssembly) that this project calls. */
declare module 'cephes' {
  const cephes: {
    readonly compiled: Promise<void>;
    j0(x: number): number;
    j1(x: number): number;
    y0(x: number): number;
    k0(x: number): number;
  };
  export default cephes;
}
