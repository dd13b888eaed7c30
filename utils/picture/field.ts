/** The key under which a labelled field hands its id and its error to the control inside it. */
export const FIELD = Symbol('field')

/** What a control needs to know of the field around it. */
export type FieldWiring = {
  id: string
  describedBy: { readonly value: string | undefined }
  invalid: { readonly value: boolean }
}
