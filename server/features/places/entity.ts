import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn, PrimaryGeneratedColumn } from 'typeorm'
import type { Equipment } from '#shared/contract/place'
import { Club } from '../people/entity'

/** Where athletes of a club train. */
@Entity({ name: 'places' })
@Index('places_club_id_name_key', ['clubId', 'name'], { unique: true })
export class Place {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @ForeignKey(() => Club, { name: 'places_club_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'club_id', type: 'uuid' })
  clubId!: string

  @Column({ name: 'name', type: 'text' })
  name!: string
}

/** A piece of equipment at a place, with the loads (kg) it can be set to where that matters. */
@Entity({ name: 'place_equipment' })
@Check(
  'place_equipment_steps_check',
  '(first_load is null and load_step is null and last_load is null) or (first_load is not null and load_step > 0 and last_load >= first_load)',
)
export class PlaceEquipment {
  @ForeignKey(() => Place, { name: 'place_equipment_place_id_fkey', onDelete: 'CASCADE' })
  @PrimaryColumn({ name: 'place_id', type: 'uuid' })
  placeId!: string

  @PrimaryColumn({ name: 'kind', type: 'text' })
  kind!: Equipment

  @Column({ name: 'first_load', type: 'double precision', nullable: true })
  firstLoad!: number | null

  @Column({ name: 'load_step', type: 'double precision', nullable: true })
  loadStep!: number | null

  @Column({ name: 'last_load', type: 'double precision', nullable: true })
  lastLoad!: number | null
}
