/** Pieces of an answer of which the first is there: what fails before it has failed before anything was answered. */
export async function begun<Piece>(pieces: AsyncGenerator<Piece>): Promise<AsyncGenerator<Piece>> {
  const first = await pieces.next()
  async function* all(): AsyncGenerator<Piece> {
    if (first.done) return
    yield first.value
    yield* pieces
  }
  return all()
}
