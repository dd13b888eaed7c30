import { describe, expect, it } from 'vitest'
import { jobBody } from '~~/utils/contract/jobs'
import { BY_NAME, emptyJob, inOrderFor, ownerOfJob, readJob, type JobDraft } from '~~/utils/jobs/jobDraft'
import { courseOfJob, newCourse } from '~~/utils/recover/course'
import { emptyFill, readFill } from '~~/utils/custody/draft/filled'

const FIRM = '0198f000-0000-7000-8000-0000000000f1'
const said: JobDraft = { ...emptyJob('R-22'), customerId: FIRM, site: ' 4 Quay Street ', equipment: 'Chiller 2', keeps: 'customer' }
const without = (changes: Partial<JobDraft>) => readJob({ ...said, ...changes })

describe('a job that is typed', () => {
  it('asks for customer, site, equipment and whose the refrigerant stays, and for nothing else', () => {
    expect(without({ customerId: '' })).toEqual({ reason: 'Choose the customer.' })
    expect(without({ customerId: BY_NAME })).toEqual({ reason: 'Write the customer’s name.' })
    expect(without({ site: '  ' })).toEqual({ reason: 'Write where the equipment stands.' })
    expect(without({ equipment: '' })).toEqual({ reason: 'Write which equipment it is.' })
    expect(without({ keeps: '' })).toEqual({ reason: 'Choose whose the refrigerant stays.' })
  })

  it('says what was typed and leaves out what was not, as the server takes it', () => {
    expect(readJob(said)).toEqual({ body: { customerId: FIRM, site: '4 Quay Street', equipment: 'Chiller 2', keeps: 'customer', refrigerant: 'R-22' } })
    const whole = without({ customerId: BY_NAME, customerName: 'Ossory Foods', charge: { unit: 'lb', value: 30 }, email: 'plant@ossory.example', appliance: 'other', circumstances: 'major', machineMade: 'since-1993-11-15' })
    expect(whole).toEqual({ body: {
      customerName: 'Ossory Foods', site: '4 Quay Street', equipment: 'Chiller 2', keeps: 'customer', refrigerant: 'R-22', charge: { unit: 'lb', value: 30 },
      email: 'plant@ossory.example', opened: { appliance: 'other', circumstances: 'major', machineMade: 'since-1993-11-15' },
    } })
    expect(jobBody.safeParse('body' in whole && whole.body).success).toBe(true)
  })
})

describe('a fill of a job', () => {
  const job = { id: 'j', keeps: 'customer' as const, customer: { id: FIRM, name: 'Ossory Foods' }, charge: { unit: 'lb' as const, value: 30 }, opened: { circumstances: 'leaking' as const } }

  it('is whose the job says', () => {
    expect(ownerOfJob(job)).toBe(FIRM)
    expect(ownerOfJob({ ...job, keeps: 'firm' })).toBe('')
    expect(ownerOfJob({ ...job, customer: { id: null, name: 'Ossory Foods' } })).toBe('')
  })

  it('beside the scale takes owner, charge and circumstances from the job, and keeps what was said here', () => {
    const course = newCourse(emptyFill('R-22'), { id: 'c', labelCode: null, name: 'c' })
    expect(courseOfJob(course, job)).toMatchObject({ jobId: 'j', ownerId: FIRM, level: { charge: { unit: 'lb', value: 30 }, circumstances: 'leaking', machineMade: '', appliance: 'other' } })
    const said = { ...course, level: { ...course.level, charge: { unit: 'kg' as const, value: 9 }, circumstances: 'major' as const } }
    expect(courseOfJob(said, job).level).toMatchObject({ charge: { unit: 'kg', value: 9 }, circumstances: 'major' })
    expect(courseOfJob(courseOfJob(course, job), null)).toMatchObject({ jobId: '', ownerId: FIRM })
  })

  it('says job and consent only where they were said', () => {
    const draft = { ...emptyFill('R-22'), grossAfter: { unit: 'kg' as const, value: 20 } }
    expect(readFill(draft)).toEqual({ details: { refrigerant: 'R-22', grossAfter: { unit: 'kg', value: 20 } } })
    expect(readFill({ ...draft, jobId: 'j', ownerConsents: true })).toEqual({ details: { refrigerant: 'R-22', grossAfter: { unit: 'kg', value: 20 }, jobId: 'j', ownerConsents: true } })
  })
})

describe('the jobs to choose from', () => {
  it('are one\'s own first, then the newest', () => {
    const job = (number: number, id: string) => ({ number, createdBy: { id, name: id } })
    expect(inOrderFor([job(4, 'a'), job(3, 'me'), job(5, 'b'), job(1, 'me')], 'me').map(({ number }) => number)).toEqual([3, 1, 5, 4])
  })
})
