/**
 * Every code the API may answer with, its HTTP status and its default message.
 * A code is a promise to scripts: add, never rename.
 */
export const errorCodes = {
  'request.invalid': [400, 'Something in the request is not as expected.'],
  'request.origin': [403, 'This request did not come from the product itself.'],
  'request.too_large': [413, 'The request is larger than the server takes.'],
  'request.too_many': [429, 'Too many requests. Wait a little and try again.'],
  'request.if_match_missing': [428, 'Say which version you edited: send If-Match.'],
  'route.not_found': [404, 'There is nothing at this address.'],
  'server.unexpected': [500, 'Something went wrong on our side. Nothing you saved is lost.'],
  'server.busy': [503, 'The server is busy computing. Try again in a moment.'],

  'auth.required': [401, 'Sign in to go on.'],
  'auth.bad_credentials': [401, 'E-mail or password is not right.'],
  'auth.slowed': [429, 'Too many tries for this account. Wait before the next one.'],
  'auth.forbidden': [403, 'Your role does not allow this.'],
  'auth.weak_password': [422, 'Use at least 12 characters that are not easily guessed.'],
  'setup.done': [409, 'This server already has its owner.'],
  'session.not_found': [404, 'There is no such session.'],

  'workspace.not_found': [404, 'There is no such workspace.'],
  'member.not_found': [404, 'There is no such member.'],
  'member.last_owner': [409, 'A workspace needs an owner. Make someone else owner first.'],
  'member.already': [409, 'This person is a member already.'],
  'invitation.not_found': [
    404,
    'This invitation is not valid: it was used, withdrawn or is out of date.',
  ],

  'lattice.not_found': [404, 'There is no such lattice.'],
  'revision.not_found': [404, 'There is no such revision.'],
  'revision.wrong_state': [409, 'The revision is not in a state that allows this.'],
  'revision.own': [403, 'Someone other than the author must accept it.'],
  'revision.unchanged': [409, 'Nothing has changed since the last revision.'],
  'draft.not_found': [404, 'There is no draft.'],
  'draft.conflict': [412, 'Someone else changed this draft after you opened it.'],
  'annotation.not_found': [404, 'There is no such remark.'],
  'annotation.bad_anchor': [
    422,
    'The remark points at a site or pair that this revision does not have.',
  ],
  'share.not_found': [
    404,
    'This link is not valid: it was withdrawn, is out of date or never existed.',
  ],
  'evaluation.not_found': [404, 'There is no such evaluation.'],
  'evaluation.failed': [500, 'The computation stopped. Try again.'],
  'evaluation.timeout': [
    422,
    'The computation took too long. Use a smaller cell or a looser tolerance.',
  ],
  'prototype.not_found': [404, 'There is no such prototype.'],
  'space_group.not_found': [404, 'There is no such space group.'],

  'cell.expression': [422, 'The expression can’t be read.'],
  'cell.parameter_name': [422, 'Use a name that starts with a letter and is not taken.'],
  'cell.parameter_cycle': [422, 'Parameters refer to each other in a circle.'],
  'cell.length': [422, 'An edge must be longer than zero.'],
  'cell.angle': [422, 'An angle must lie between 0° and 180°.'],
  'cell.angle_sum': [422, 'The three angles can’t close a cell.'],
  'cell.zero_volume': [422, 'The cell has no volume.'],
  'cell.system_constraint': [422, 'The lattice parameters do not fit the crystal system.'],
  'cell.space_group': [422, 'There is no such space group.'],
  'cell.operation': [422, 'The symmetry operation can’t be read.'],
  'cell.no_sites': [422, 'A cell needs at least one site.'],
  'cell.element': [422, 'There is no such element.'],
  'cell.charge': [422, 'A charge must be a number between −9 and 9.'],
  'cell.label': [422, 'Each site needs its own label.'],
  'cell.occupancy': [
    422,
    'An occupancy must lie above 0 and at most 1; the sum on one place at most 1.',
  ],
  'cell.coordinate': [422, 'A coordinate must be a finite number.'],
  'cell.coincident_sites': [422, 'Two sites lie on the same place.'],
  'cell.not_neutral': [
    422,
    'The charges do not add up to zero, so the cell has no Madelung energy.',
  ],
  'cell.no_charges': [422, 'Every charge is zero, so there is nothing to sum.'],
  'cell.too_many_sites': [422, 'The cell has more sites than this server takes.'],

  'data.key': [
    422,
    'There is no such quantity. Keys read mass:Na, ionisation:Na:1, radius:Na+1:6 …',
  ],
  'data.value': [422, 'The value lies outside of what the quantity can be.'],
  'data.not_found': [404, 'The workspace has no value of its own here.'],
  'data.too_many': [422, 'The workspace has as many values of its own as it may.'],

  'file.unreadable': [422, 'The file can’t be read.'],
  'cif.syntax': [422, 'The CIF can’t be read.'],
  'cif.no_structure': [422, 'The CIF holds no structure.'],
  'cif.missing_value': [422, 'A value the structure needs is missing.'],
  'cif.bad_value': [422, 'A value can’t be read as a number.'],
  'cif.duplicate_tag': [422, 'A data name stands twice.'],
  'cif.loop_count': [422, 'A loop’s values do not fill its rows.'],
  'cif.symmetry': [422, 'The symmetry can’t be made out.'],
  'cif.ambiguous_origin': [422, 'The space group has two origins and the file does not say which.'],
  'cif.charges_needed': [
    422,
    'Oxidation numbers are needed: none are given and no single neutral choice exists.',
  ],
} as const satisfies Record<string, readonly [number, string]>;

/** A code the API may answer with. */
export type ErrorCode = keyof typeof errorCodes;
