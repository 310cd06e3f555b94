import type { Migration } from "../migration.ts";

/**
 * Stock that a shop keeps itself: screws as a kind, a version for each item, one name once among what is in stock. Items
 * are brought to what version 2 of the mockup document holds, as its own upgrade from version 1 does it, so that a
 * drawing and the item it was drawn with still agree. Every shop had the seven usual screws without a row; they get one.
 */
export const stock: Migration = {
  name: "2026-12-01-07-stock",
  up: (sql) =>
    sql(`
alter table stock_items drop constraint stock_items_kind_check;
alter table stock_items add constraint stock_items_kind_check check (kind in ('acrylic', 'wood', 'hardware', 'screw', 'adhesive'));
alter table stock_items add column version integer not null default 1 check (version > 0);

update stock_items set properties = jsonb_set(properties, '{sheets}', '[]')
 where kind = 'acrylic' and properties -> 'sheets' is null;
update stock_items set properties = jsonb_set(properties, '{wood,movementPerPoint}',
    case when properties #>> '{wood,hardness}' = 'softwood' then '0.00267'::jsonb else '0.00369'::jsonb end)
 where kind = 'wood' and properties #> '{wood,movementPerPoint}' is null;
update stock_items set properties = jsonb_set(properties, '{hardware,screw}', properties #> '{hardware,screw}' || jsonb_build_object(
    'gauge', substring(properties #>> '{hardware,screw,name}' from '^No\\. ([0-9]{1,2})\\M')::integer, 'head', 'flat'))
 where kind = 'hardware' and properties #> '{hardware,screw}' is not null and properties #> '{hardware,screw,head}' is null;

-- Of several of one name the oldest keeps it, the others are numbered.
do $$ declare doubled record; number integer; free text; begin
  for doubled in
    select id, shop_id, kind, name from (
      select *, row_number() over (partition by shop_id, kind, lower(name) order by created_at, id) as place
        from stock_items where retired_at is null) placed
     where place > 1 order by shop_id, kind, lower(name), place
  loop
    number := 1;
    loop
      number := number + 1;
      free := left(doubled.name, 112) || ' (' || number || ')';
      exit when not exists (select from stock_items where shop_id = doubled.shop_id and kind = doubled.kind and lower(name) = lower(free));
    end loop;
    update stock_items set name = free, properties = jsonb_set(properties, array[kind, 'name'], to_jsonb(free)) where id = doubled.id;
  end loop;
end $$;
create unique index stock_items_name on stock_items (shop_id, kind, lower(name)) where retired_at is null;

insert into stock_items (id, shop_id, kind, name, properties, version, created_at)
select gen_random_uuid(), shops.id, 'screw', 'No. 6 × ' || length || ', flat head', jsonb_build_object('screw', jsonb_build_object(
    'name', 'No. 6 × ' || length || ', flat head', 'gauge', 6, 'head', 'flat', 'diameter', 3.5052000000000003, 'length', length,
    'headDiameter', 7.086600000000001, 'headHeight', 2.0599647068106623)), 1, now()
  from shops cross join unnest(array[12, 16, 19, 25, 32, 38, 45]) as length;
`),
  down: (sql) =>
    sql(`
delete from stock_items where kind = 'screw';
drop index stock_items_name;
update stock_items set properties = properties - 'sheets' where kind = 'acrylic';
update stock_items set properties = properties #- '{wood,movementPerPoint}' where kind = 'wood';
update stock_items set properties = properties #- '{hardware,screw,gauge}' #- '{hardware,screw,head}' where kind = 'hardware';
alter table stock_items drop column version;
alter table stock_items drop constraint stock_items_kind_check;
alter table stock_items add constraint stock_items_kind_check check (kind in ('acrylic', 'wood', 'hardware', 'adhesive'));
`),
};
