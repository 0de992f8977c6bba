/** A test rack that calls with a token of its own, as the database knows it at this moment. */
export interface RackCaller {
  id: number;
  name: string;
  tokenId: number;
  /** The parts it may send readings of. */
  partIds: ReadonlySet<number>;
}
