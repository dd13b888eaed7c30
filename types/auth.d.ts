declare module '#auth-utils' {
  interface SecureSessionData {
    /** The session's secret; only its hash is stored. */
    sid: string
  }
}

export {}
