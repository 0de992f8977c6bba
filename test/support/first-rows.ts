/**
 * A person, a part, an effective plan, and a drawn lot with two readings of which one is withdrawn, in the words of the very
 * first version of the database: what any later version must still be able to take over.
 */
export const FIRST_ROWS = `
insert into people (id, name, email) values (1, 'Quill Averard', 'quality@hollowmere.example');
insert into suppliers (id, code, name, address, contact_name) values (1, 'KES', 'Kestrin Power', '', '');
insert into parts (id, number, name, form, topology, line_volts, line_hertz, rated_volts, rated_amperes, filter_farads)
  values (1, 'WA-12-500', 'Wall adapter', 'wall-adapter', 'bridge', 230, 50, 12, 0.5, 0.0015);
insert into plans (id, number, part_id) values (1, 'P-001', 1);
insert into plan_revisions (id, plan_id, revision, status, level, change_note, author_id, created_at)
  values (1, 1, 1, 'draft', 'II', 'First', 1, '2026-01-05T08:00:00.000Z');
insert into plan_class_aqls (revision_id, class, aql) values (1, 'major', '1.0');
insert into plan_characteristics (id, revision_id, position, key, content) values (1, 1, 0, 'v_loaded',
  '{"kind":"measured","key":"v_loaded","name":"Loaded voltage","class":"major","condition":"","method":"","caution":"","ownLevel":null,"ownAql":null,"unit":"V","decimals":2,"target":12,"lowerLimit":11.4,"upperLimit":12.9,"entryMode":"direct","instrumentKind":"multimeter"}');
update plan_revisions set status = 'effective', effective_at = '2026-01-06T08:00:00.000Z' where id = 1;
insert into instruments (id, asset_number, kind, description, serial_number, place, calibration_due, status)
  values (1, 'DM-01', 'multimeter', 'Bench multimeter', '', '', '2026-12-31', 'in-service');
insert into lots (id, number, status, part_id, supplier_id, delivery_number, order_number, counted_quantity, stated_quantity,
    date_code, cartons, place, note, arrived_at, booked_by_id, revision_id, severity, sample_size, seed, drawn_at)
  values (1, 'L-26-0001', 'measuring', 1, 1, 'D-1', '', 20, 20, '', 1, '', '', '2026-01-07T08:00:00.000Z', 1, 1, 'normal', 1, 7,
    '2026-01-07T09:00:00.000Z');
insert into sample_units (id, lot_id, unit, position, carton) values (1, 1, 1, 4, 1);
insert into readings (id, lot_id, unit_id, characteristic_id, attempt, value, entry, instrument_id, note, taken_by_id, taken_at,
    received_at, withdrawn_at, withdrawn_by_id)
  values ('0197a000-0000-7000-8000-000000000001', 1, 1, 1, 1, 1.21, '{"kind":"direct","text":"1.21","decimalComma":false}', 1, '',
    1, '2026-01-07T10:00:00.000Z', '2026-01-07T10:00:01.000Z', '2026-01-07T10:01:00.000Z', 1);
insert into readings (id, lot_id, unit_id, characteristic_id, attempt, value, entry, instrument_id, note, taken_by_id, taken_at,
    received_at)
  values ('0197a000-0000-7000-8000-000000000002', 1, 1, 1, 2, 12.1, '{"kind":"direct","text":"12.1","decimalComma":false}', 1, '',
    1, '2026-01-07T10:02:00.000Z', '2026-01-07T10:02:01.000Z');
`;
