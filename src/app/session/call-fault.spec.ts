import { HttpErrorResponse } from '@angular/common/http';
import { callFault } from './call-fault';

const refused = (body: object): HttpErrorResponse => new HttpErrorResponse({ status: 422, error: body });

describe('what a person is told of a failed call', () => {
  it('is the detail of the problem, its request, and the fault of each field by name', () => {
    const fault = callFault(
      refused({
        type: '/problems/invalid-input',
        title: 'Invalid input',
        status: 422,
        detail: 'Two fields need another value.',
        requestId: '0f9d',
        errors: [
          { pointer: '#/newPassword', detail: 'must have at least 15 characters' },
          { pointer: '/roles/0', detail: 'is no role' },
        ],
      }),
    );
    expect(fault).toEqual({ detail: 'Two fields need another value.', requestId: '0f9d', fields: { newPassword: 'must have at least 15 characters', roles: 'is no role' } });
  });

  it('says that nothing is lost when there was no answer', () => {
    const fault = callFault(new HttpErrorResponse({ status: 0 }));
    expect(fault.detail).toContain('What you typed is kept');
    expect(fault.requestId).toBeUndefined();
  });

  it('does not hide a fault of the program', () => {
    expect(() => callFault(new TypeError('x is undefined'))).toThrow('x is undefined');
  });
});
