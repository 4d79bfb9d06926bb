### English. One key set for all languages; the tests compare them.

## The frame

page-title = { $place } – Vitalroll
job = From a follow-up register to answers: what became of the patients, which group did better, and how many will be under care.
skip-to-content = Skip to the content
places-label = Places
language = Language
undo = Undo
licences = Licences of the software inside
engine-version = Vitalroll { $version }
always-cautions = Describes groups; not for decisions about one patient. Local guidelines and licensed practice prevail. Association is not cause.

place-register = Register
place-outcomes = Outcomes
place-compare = Compare
place-caseload = Caseload
place-counts = From counts
place-report = Report

needs-javascript = Vitalroll needs JavaScript, which is switched off in this browser.

## The engine's start and the seal

engine-stage-waiting = Getting ready…
engine-stage-fetching = Fetching the engine: { $done } of { $total }
engine-stage-unpacking = Unpacking the engine…
engine-stage-runtime = Starting the engine…
engine-stage-libraries = Loading the numerical libraries…
engine-stage-desk = Opening the desk…
not-yet-sealed = Not sealed yet. A register can be opened once the page is sealed.
sealed = Sealed: the browser now refuses what this page asks of any network.
seal-broken = Not sealed: this browser still lets the page reach a network. Do not open a register here; use a current browser.
sealed-meaning = Everything needed has been fetched. The browser now refuses this page's requests for files, images, frames, forms and connections, and the page asks for none. No browser rule stops a page from moving to another address or every kind of direct connection; this page's program does neither. To be certain, disconnect the network before opening a register. Reloading the page begins again, with nothing kept.
sealed-tried = To make sure, the page tried { $tried } harmless requests to its own address after sealing; the browser refused { $refused }.
sealed-check-yourself = To check it yourself: disconnect the network now; everything goes on working. Or open the browser's developer tools at the network list and watch that nothing is added.
engine-revived-out_of_memory = The engine ran out of memory and was started again. Your file and your choices are back; the last question was not answered.
engine-revived-internal = The engine stopped unexpectedly and was started again. Your file and your choices are back.
engine-revived-register_lost = The engine was started again, but your register could not be opened again. Open the file once more.
engine-revived-gone = The engine stopped and could not be started again. Reload the page and open the file once more.
engine-revived-stopped = Stopped. Your file and your choices are back.
start-again = Start again
engine-failure-network = The engine could not be fetched. Check the connection to where this page came from, then start again.
engine-failure-integrity = A part of the engine arrived damaged or changed, so it was not used. Start again; if this repeats, tell whoever hosts this page.
engine-failure-too_old = This browser is too old for the engine. Use a current Firefox, Chrome, Edge or Safari.
engine-failure-internal = The engine could not be started. Start again; if this repeats, try another current browser.
megabytes = { $size } MB

## Words that every place uses

estimate = { $value } ({ $lower } to { $upper })
everyone = Everyone
working = Working…
answer-working = Working this out …
stop = Stop
save-table = Save this table as CSV
save-figure = Save this figure as SVG
figure-data = The numbers behind this figure
cautions-label = Cautions
no-register-yet = Open a register first, in the place Register; or use From counts if you have only totals.
choose = Choose…
none = None
years-count = { $years ->
    [one] { $years } year
   *[other] { $years } years
}

meaning-under_care = under care
meaning-died_of_disease = died of the disease
meaning-died_of_other_cause = died of another cause
meaning-died_cause_unknown = died, cause unknown
meaning-recovered = recovered or completed treatment
meaning-moved_away = moved away (transferred)
meaning-lost = lost to follow-up
meaning-stopped = stopped by choice

covariate-sex = Sex
covariate-age = Age at start
covariate-age_band = Age group at start
covariate-start_year = Year of start
covariate-start_period = Period of start
sex-female = Female
sex-male = Male
sex-other = Other

question-interest = Which endings count as the outcome?
question-interest-hint = Every other ending only ends observation.
question-group = By group
question-no-group = No groups: everyone together

## Refusals that any place can meet

refusal-internal = This could not be worked out because of a fault in the program. Nothing you entered was lost.
refusal-worker_died = The engine stopped while working on this, twice. Ask for less at once, for example fewer groups or a smaller file.
refusal-out_of_memory = There was not enough memory for this. Close other tabs, or open a smaller file.
refusal-stopped = Stopped before it was finished.
refusal-no_register = Open a register first.
refusal-unknown_field = The request had a part that is not known: { $field }.
refusal-missing_field = Something is still missing: { $field }.
refusal-wrong_type = { $field } is not of the right kind.
refusal-not_one_of = { $field } is not one of the possible choices.
refusal-out_of_range = { $field } must be from { $least } to { $greatest }.
refusal-unknown_task = The engine does not know how to do this.
refusal-unknown_meaning = { $meaning } is not one of the known endings.
refusal-unknown_covariate = The column { $covariate } is not part of the register as it was read.
refusal-group_is_numeric = { $covariate } is a number. Choose a column with a few categories to group by.
refusal-no_outcome_of_interest = Choose at least one ending that counts as the outcome.
refusal-under_care_is_not_an_outcome = Being under care is not an outcome: choose an ending.
refusal-uneven_cohort = The columns of the register do not have the same length.
refusal-negative_time = Line { $line }: time before the start of follow-up.
refusal-exit_before_entry = Line { $line }: follow-up ends before it begins.

## Register

register-title = Register

register-lead = Open the list of patients: one row for each patient, from a spreadsheet or a text file. It is read on this computer and nowhere else.
open-file = Choose a file, or drop one here
open-file-hint = .csv, .tsv, .txt, .xlsx or .ods
open-demo = Open the invented demo register
demo-meaning = About 1,160 invented patients of an invented rheumatic heart disease clinic, with the faults that real registers have.
open-not-yet = A register can be opened as soon as the engine is ready and the page is sealed; see the line at the top.
paste-summary = Or paste cells from a spreadsheet
paste-label = Cells with their headings
paste-open = Open what was pasted
pasted-name = pasted cells
opening-file = Reading…
opening-share = Reading: { $share }
replace-question = A register is open. Opening another one drops it, with every choice made about it.
replace-yes = Open the other one
replace-no = Keep this one

register-example-title = What the list needs
register-example-lead = At the least: when follow-up began, when the patient was last seen or left, and how it ended. A patient number finds duplicates and is dropped afterwards. Other columns can be used to group patients; those not used are dropped.
register-example-caption = An invented example
register-example-number = Number
register-example-start = Start of follow-up
register-example-end = Last contact or end
register-example-outcome = How it ended
register-example-sex = Sex
register-example-group = Stage
register-example-number-1 = 101
register-example-start-1 = 14/03/2019
register-example-end-1 = 02/06/2025
register-example-outcome-1 = Under care
register-example-sex-1 = F
register-example-group-1 = Mild
register-example-number-2 = 102
register-example-start-2 = 20/05/2019
register-example-end-2 = 11/01/2022
register-example-outcome-2 = Died
register-example-sex-2 = M
register-example-group-2 = Severe
register-example-number-3 = 103
register-example-start-3 = 03/09/2020
register-example-end-3 = 17/02/2023
register-example-outcome-3 = Lost
register-example-sex-3 = F
register-example-group-3 = Moderate

source-title = The file
source-delimited = { $rows } rows, { $columns } columns, between them a { $delimiter }; letters as { $encoding }.
source-workbook = a workbook: { $rows } rows, { $columns } columns.
source-sheet = Sheet
source-header = Line with the headings
source-header-hint = Change it if the headings stand elsewhere.
delimiter-comma = comma
delimiter-semicolon = semicolon
delimiter-tab = tab
delimiter-bar = bar
preview-caption = The first rows as they were read
line = Line
rows = Rows

columns-title = Which column is what
columns-lead = The choices below are proposals. Correct what is wrong; everything after follows.
columns-caption = Columns and their use
columns-dropped = Columns marked “not used” are dropped before anything is worked out, and so are patient numbers and names, once they have been compared.
column-heading = Column
column-looks = What stands in it
column-role = Use
column-unnamed = Column { $position }, without heading
role-of = Use of { $column }
role-none = not used
role-patient_number = patient number
role-start = start of follow-up (diagnosis)
role-observed_from = first seen here, if later
role-end = last contact or end
role-outcome = how it ended
role-sex = sex
role-birth_date = date of birth
role-age = age at start
role-group = to group by
order-settled = Dates: { $order }.
order-ask = How are the dates written?
order-day_month_year = day, month, year
order-month_day_year = month, day, year
order-year_month_day = year, month, day
order-serial_1900 = spreadsheet day numbers
order-serial_1904 = spreadsheet day numbers, counted from 1904

meanings-title = How it ended: what each value means
meanings-lead = Rows whose value has no meaning are set aside and counted.
meanings-caption = Values of the outcome column
meaning-none = no meaning: set aside
meaning-of = Meaning of { $value }
blank-value = (nothing written)
value = Value
means = Means
sexes-title = Sex: what each value means
sexes-lead = Values without a meaning count as not recorded.
sexes-caption = Values of the sex column
sex-none = not recorded

closing-title = The closing date
closing-label = Day on which the register was frozen
closing-hint = Nobody is followed beyond it. It is asked for because it cannot be seen from the file, and the computer's clock is never used.

understood-title = What was understood
still-missing = Still to be chosen:
missing-start = the column with the start of follow-up
missing-end = the column with the last contact or end
missing-outcome = the column that says how it ended
missing-closing = the closing date
missing-order = how the dates are written
missing-meanings = what the values of the outcome column mean
understood-sentence = { $n } patients from { $rows } rows, who started between { $first } and { $last } and were followed to { $closing } at the latest: { $years } person-years.
outcomes-caption = How follow-up ended
how-it-ended = How it ended
reason = Reason
every-line = Every line
set-aside-nothing = No row was set aside.
set-aside-title = { $n ->
    [one] One row was set aside
   *[other] { $n } rows were set aside
  }
set-aside-caption = Set aside, by reason
set-aside-lines-caption = Rows set aside, with their line in the file
changed-nothing = No row was changed.
changed-title = { $n ->
    [one] One row was read with a change
   *[other] { $n } rows were read with a change
  }
changed-caption = Changes, by reason
changed-lines-caption = Rows changed, with their line in the file
dropped-columns = Dropped before analysis: { $columns }.
next = Now:
findings-title = What may be wrong
findings-empty = Findings are shown once the register is understood.
findings-none = None of the checks found anything.
findings-sentence = The checks found { $n ->
    [one] one thing
   *[other] { $n } things
  } to look at; a repair is proposed for { $repairs }.
findings-sentence-untouched = Nothing has been repaired: every result uses the register as it was read.
findings-sentence-accepted = With { $accepted ->
    [one] one repair
   *[other] { $accepted } repairs
  } accepted ({ $cells ->
    [one] one change
   *[other] { $cells } changes
  }), there are { $n } patients instead of { $before }, { $deaths } deaths instead of { $deathsBefore }, and survival at { $years } years is { $survival } instead of { $survivalBefore }.
findings-caption = What the checks found, and the repairs that could be made
findings-method = Each check looks at the register as it was written; a repair is made only when it is accepted, in the order of this table, and what one has changed no later one changes again. The effect is worked out by building the cohort twice, with and without the repair, all other accepted repairs kept: patients, deaths of any cause, patients lost, and product-limit survival (Kaplan & Meier 1958) at { $years } years. Names are compared by the number of slips between them (Damerau 1964), neighbours in alphabetical order with the same birth date or start (Hernández & Stolfo 1995), and are then dropped.
finding = Finding
finding-lines = { $n ->
    [one] Line { $lines }
   *[other] Lines { $lines }
  }
repair = Proposed repair
decision = Decision
change = Change
severity-grave = (grave)
severity-doubtful = (doubtful)
severity-slight = (slight)
repair-accept = make this repair
repair-accept-of = Accept the repair: { $finding }
repair-accept-row = Repair line { $line }
repair-accepted = accepted
repair-not-accepted = not accepted
repair-none = none: look it up in the records
effect-n = Patients { $before } → { $after }.
effect-events = Deaths { $before } → { $after }.
effect-lost = Lost { $before } → { $after }.
effect-survival = Survival at { $years } years { $before } → { $after }.
effect-nothing = It changes neither the number of patients, deaths or losses, nor survival at five years.
effect-overruled = { $n ->
    [one] One row was
   *[other] { $n } rows were
  } already changed by a repair above.
effects-summary = The figures with and without each repair
effects-caption = The headline result with and without each repair
effects-n-without = Patients without it
effects-n-with = Patients with it
effects-events-without = Deaths without it
effects-events-with = Deaths with it
effects-lost-without = Lost without it
effects-lost-with = Lost with it
effects-survival-without = Survival at { $years } years without it
effects-survival-with = Survival at { $years } years with it
row-by-row = Row by row: { $finding } ({ $n })
row-by-row-hint = Accept the repair above first; then rows can be left as they are one by one.
row-by-row-caption = { $finding }: each row
row-by-row-first = The first { $listed } of { $n } rows are listed; the decision above counts for all.
corrections-caption = Corrections made, to be taken back to the record room
corrections-none = No correction was made.
correction-what = What
correction-before = Written
correction-after = Read as
change-of-start = start
change-of-end = end of follow-up
change-of-outcome = how it ended
change-of-birth = birth date
change-of-same_as = patient
change-of-number = patient number
change-to = { $what }: { $before } → { $after }
change-same_as = line { $line } is the patient of line { $after }
change-number = counts as a patient of its own
change-on-line = line { $line }: { $change }
on-line = line { $line }
nothing-written = (not recorded)
caution-corrections_shortened = { $listed } of { $n } corrections are listed; all are made.

finding-slipped_sideways-short = Cells slipped sideways
finding-slipped_sideways = The cells stand one column beside their own.
repair-read_beside = read the row from where its cells stand
finding-day_and_month_changed_over-short = Day and month changed over
finding-day_and_month_changed_over = The dates contradict each other as they stand, and fit when day and month are changed over in one of them.
repair-change_over = change day and month over
finding-ends_before_start-short = Ends before it starts
finding-ends_before_start = The end lies before the start, so the row is set aside.
repair-year_later = where the end is early in a year, take the year after: the old year was perhaps written on
finding-far_after_closing-short = Far after the closing date
finding-far_after_closing = A date lies more than a year after the closing date: a mistyped year, or another calendar.
finding-born_in_wrong_century-short = Born in the wrong century
finding-born_in_wrong_century = A birth year with two digits was read as lying after the start.
repair-century_back = take a hundred years off the birth date
finding-no_such_day-short = No such day
finding-no_such_day = The calendar has no such day, so the row is set aside.
repair-last_of_month = take the last day of that month
finding-death_date_but_alive-short = A date of death, but not “died”
finding-death_date_but_alive = A date of death is written, and how it ended is something else.
repair-count_as_died = count as died, cause unknown, on that date
finding-contact_after_death-short = Contact after death
finding-contact_after_death = The last contact is later than the date of death; follow-up runs to the later of the two.
repair-end_at_death = end follow-up on the date of death
finding-died_without_date-short = Died, with no date
finding-died_without_date = Somebody died and no date is written, so the row is set aside and a death is not counted: survival looks better than it is.
finding-death_dated_by_contact-short = Death dated by the last contact
finding-death_dated_by_contact = The date of death is blank, and the death counts on the day of the last contact, which came before it.
repair-midway = place the death midway between last contact and closing date
finding-transfer_as_lost-short = Transfers among the lost
finding-transfer_as_lost = What is written speaks of a transfer, and was taken for lost.
repair-count_as_moved = count as moved away
finding-unseen_for_long-short = Under care, but long unseen
finding-unseen_for_long = Counted as under care, and not seen for more than { $months } months before the closing date.
repair-count_as_lost = count as lost to follow-up on the day last seen
finding-closing_date_as_contact-short = Closing date copied as last contact
finding-closing_date_as_contact = { $share } of those who did not die were last seen on the very closing date. A list was perhaps filled in from a desk, and losses are hidden.
finding-same_number-short = One patient in several rows
finding-same_number = { $patients ->
    [one] One patient number stands
   *[other] { $patients } patient numbers stand
  } on several rows; the first that can be used counts, the others are set aside.
repair-make_one = make one row: the earliest start, and the latest end with how it ended; a death goes before all else
finding-one_number_two_people-short = One number, two people
finding-one_number_two_people = { $numbers ->
    [one] One patient number stands
   *[other] { $numbers } patient numbers stand
  } on rows with different sex or birth date; only the first of them counts.
repair-count_each = count each row as a patient of its own
finding-likely_same_person-short = Probably one person
finding-likely_same_person = { $patients ->
    [one] One person seems
   *[other] { $patients } persons seem
  } to stand here under different numbers: name, birth date, sex or start agree as far as they are known.
finding-more_cells_than_columns-short = More cells than columns
finding-more_cells_than_columns = A separator stands inside a cell, so nobody can say which cell is which; the rows are set aside.
finding-age_against_birth-short = Age against birth date
finding-age_against_birth = The written age and the date of birth are more than a year apart; age is worked out from the date of birth.
repair-written_age = let the written age count
finding-months_without_start-short = Months without newcomers
finding-months_without_start = In { $n ->
    [one] one month
   *[other] { $n } months
  } nobody starts ({ $months }). Were pages lost, or was the clinic closed?
finding-sex_not_recorded-short = Sex not recorded
finding-sex_not_recorded = The sex is blank, or a value that was given no meaning.
finding-died_on_first_day-short = Died on the first day
finding-died_on_first_day = The death is on the day of the start: perhaps the disease was only found at death.
finding-heaped_starts-short = Starts heaped on two days
finding-heaped_starts = { $share } of starts are on the 1st or the 15th of a month, where 7 % would be expected: the day was often not known.
finding-heaped_ends-short = Ends heaped on two days
finding-heaped_ends = { $share } of ends are on the 1st or the 15th of a month, where 7 % would be expected: the day was often not known.
finding-two_digit_years-short = Years with two digits
finding-two_digit_years = Each was taken as lying between { $first } and { $last }.
finding-totals_among_rows-short = Totals among the patients
finding-totals_among_rows = Rows with totals are no patients and are set aside.
finding-headings_repeated-short = Headings repeated
finding-headings_repeated = The headings stand again among the patients and are set aside.

set-aside-same_patient = The same patient stands on line { $first_line }; the rows were made one.
set-aside-same_patient-short = Made one with another row
role-name = name: only to find patients twice
role-death_date = date of death

silent-title = Losses that nobody wrote down
silent-months = Lost when not seen for more than this many months before the closing date
silent-months-hint = Longer than the longest time between two visits that is usual in your clinic.
silent-count = count them as lost
silent-sentence = { $changed } of { $care } patients under care were not seen for more than { $months } months before the closing date. Counting them as lost would raise the lost from { $before } ({ $was }) to { $after } ({ $share }).
silent-sentence-counted = { $changed } of { $care } patients under care were not seen for more than { $months } months before the closing date, and count as lost: { $after } lost ({ $share }) instead of { $before } ({ $was }).
silent-caption = How many count as lost, by the months that the rule allows
silent-unseen = Months unseen
silent-changed = Under care, then lost
silent-lost = Lost in all
silent-method = Follow-up of those the rule counts as lost ends on the day they were last seen, as before; only its meaning changes. Survival is therefore the same, but the bounds for losses widen, and retention falls. A month is 365.25 / 12 days.
caution-under_care_without_contact = { $n } of { $of } patients under care have no last contact at all: they are followed to the closing date on trust, and this rule cannot judge them.

spellings-title = Spellings of groups
spellings-none = No value of the columns to group by looks like another, misspelt.
spellings-caption = { $heading }: values that are probably one
spellings-method = Values are compared word by word with those that stand in more rows: one slip in words of 5 letters or more, two in words of 10 or more (Damerau 1964); numbers, short words and first letters must be the same. Nothing is made one unasked.
spelling-into = Probably
spelling-merge = make them one
spelling-merge-of = Take { $value } for { $into }
value-like = spelt like “{ $value }”
refusal-merged_in_a_circle = “{ $value }” is taken for a value that is taken for it.

settings-title = The same choices for the next list
settings-lead = What is chosen on this page (columns, meanings, rules, closing date, kinds of repairs) can be kept in a small file. It holds headings and common values, and nothing of a patient.
settings-apply = Apply choices kept earlier:
settings-save = Save these choices
settings-save-later = Possible once everything is chosen.
settings-left-out = { $n ->
    [one] One value is
   *[other] { $n } values are
  } not in the file, because fewer than three rows have it: it could speak of one patient.
settings-applied = The kept choices were applied to { $matched } columns of this list.
settings-absent = Columns that this list does not have:
settings-added = Columns that are new in this list, and not used until chosen:
settings-new-values = Endings that the kept choices do not know:
settings-rows = { $n ->
    [one] one row
   *[other] { $n } rows
  }
settings-no-difference = Columns and endings are the same as then.
caution-order_differs = The dates in “{ $heading }” are no longer written as { $order }; they were read as they show themselves.
caution-not_dates_any_more = “{ $heading }” holds no dates in this list; it is not used.
caution-closing_date_from_settings = The closing date, { $closing }, is that of the earlier list. Change it to the day on which this list was frozen.
caution-dates_after_closing = { $n } dates lie after { $closing } and would not count.
refusal-settings_not_read = This is not a file of choices kept by this page.
refusal-settings_too_new = These choices were kept by a later version of this page (form { $version }; this page knows { $known }).

profile-title = How good the register is
profile-site = Completeness also by
profile-no-site = no groups
completeness-sentence = { $index } of the time that could have been observed was observed; { $known } where recovery, moving away and stopping by choice count as complete.
completeness-by-year = Completeness of follow-up, by year of start
completeness-by-site = Completeness of follow-up, by group
completeness-year = Year of start
completeness-observed = Person-years observed
completeness-possible = Person-years possible
completeness-index = Person-time index
completeness-known = Known endings complete
profile-newcomers = Newcomers by month
profile-newcomers-described = Bars for { $months } months, one for each, as high as the number of patients who started in it.
profile-month = Month
profile-missing = What is missing, by column and by how follow-up ended
profile-missing-note = Blank cells and words such as “unknown” or “n/a”. Where the share differs between endings, comparing only complete rows can mislead. The last column: recovered, moved away or stopped.
profile-missing-cells = Missing
profile-ending-under_care = Under care
profile-ending-died = Died
profile-ending-lost = Lost
profile-ending-known = Known ending
profile-days-start = Of the starts, { $share } are on day { $day } of a month, where { $expected } would be expected.
profile-days-start-title = Starts by day of the month
profile-days-end = Of the ends before the closing date, { $share } are on day { $day } of a month, where { $expected } would be expected.
profile-days-end-title = Ends by day of the month
profile-days-described = Bars for the 31 days of a month with a short line at the height expected by chance; day { $day } stands out most.
profile-day = Day
profile-expected = Expected
profile-ages = Whipple’s index of the written ages is { $index }, from { $n } ages between 23 and 62: 100 means no preference for ages ending in 0 and 5, and 500 that there are no others.
profile-ages-from-birth = Whipple’s index of the ages worked out from birth dates is { $index }, from { $n } ages between 23 and 62: 100 means no preference for ages ending in 0 and 5. Rounded birth years show in it only in part.
profile-ages-title = Ages from 23 to 62 by their last digit
profile-ages-described = Ten bars, one for each last digit, with a short line at the height expected without preference.
profile-digit = Last digit
profile-method = Person-time index: time observed over time that could have been observed until the closing date or death (Clark, Altman & De Stavola 2002). Whipple’s index: 500 times the share of ages ending in 0 or 5 among those from 23 to 62, with limits by Wilson (1927); by the usual reading (United Nations 1955) below 105 is very accurate and 175 or more very rough. Expected days are those of the calendar over 400 years.
caution-few_ages = Only { $n } ages between 23 and 62: with fewer than { $least }, the index is hardly more than chance.
caution-many_sites = { $sites } groups are too many for this table (at most { $most }).
refusal-nobody_to_profile = Every row was set aside, so there is nothing to describe.

trace-title = Whom to look for
trace-months = Months since the last contact, more than
trace-with-lost = also those written down as lost
trace-columns = Columns to put on the list
trace-columns-legend = Columns on the list
trace-columns-hint = Nothing but these, the line in the file and the last contact is shown or saved.
trace-sentence = { $n ->
    [one] One patient was
   *[other] { $n } patients were
  } not seen for more than { $months } months before the closing date.
trace-unjudged = { $n ->
    [one] One more is
   *[other] { $n } more are
  } under care with no last contact at all, so nobody can say how long ago it was.
trace-method = Days from the last contact to the closing date, the longest first. Deaths, recoveries, transfers and those who stopped by choice are not listed. The list itself is kept out of the report.
trace-days = Days unseen
trace-last = Last contact
trace-caption = The longest unseen first
trace-first = The first { $shown } of { $n } are shown; the file holds all.
trace-save = Save the list of { $n } as CSV on this computer
caution-trace_list_identifies = This list identifies people. Keep it where the register itself is kept, hand it only to those who do the tracing, and delete it afterwards.
caution-trace_list_shortened = { $listed } of { $n } are listed.

calendar-title = Another calendar?
calendar-of = Calendar of { $column }
calendar-gregorian = Gregorian, or Buddhist years
calendar-ethiopian = Ethiopian (day, month, year)
calendar-persian = Persian
calendar-hijri = Hijri
calendar-bikram_sambat = Bikram Sambat
refusal-calendar_not_converted = The dates in “{ $heading }” follow another calendar ({ $calendar }). It cannot be converted by subtraction, and this page has no tables for it. Have the dates converted in the program they come from, and save the list again.
finding-partial_date-short = Day or month not known
finding-partial_date = Only the month or the year of a date is written, so the row is set aside, or its age is not known.
repair-middle_of_period = take the 15th of that month, or 1 July of that year, kept between start and closing date
repair-first_of_period-effect = With the first day instead, survival at { $years } years would be { $survival } ({ $deaths } deaths);
repair-last_of_period-effect = with the last day, { $survival } ({ $deaths } deaths, at { $years } years).

register-other-title = Another register
forget = Forget everything
forget-meaning = Drops the register and every choice made about it from memory.

evidence-heading_says = Its heading says “{ $words }”.
evidence-reads_as_dates = { $read } of { $filled } look like dates.
evidence-order_settled = { $n ->
    [one] One date shows
   *[other] { $n } dates show
  } the order: { $order }.
evidence-order_not_settled = Nothing shows whether the day or the month comes first.
evidence-reads_as_numbers = Numbers in all { $filled } rows that are filled.
evidence-values_recognised = { $recognised } of { $filled } say something recognised.
evidence-all_different = { $distinct } different values.
evidence-few_values = { $distinct } different values.
evidence-many_values = { $distinct } different values: too many to group by.
evidence-heading_identifies = Its heading (“{ $words }”) says that it identifies people.
evidence-heading_of_notes = Its heading (“{ $words }”) says that it holds notes.
evidence-earliest_dates = Its dates come first.
evidence-latest_dates = Its dates come last.
evidence-free_text = Free text.
evidence-nothing_in_it = Nothing stands in it.

set-aside-repeated_heading = The headings stand here again.
set-aside-repeated_heading-short = Headings repeated
set-aside-subtotal_row = A total, not a patient.
set-aside-subtotal_row-short = Totals
set-aside-too_many_cells = More cells than there are columns ({ $cells } instead of { $columns }): perhaps a separator stands inside a cell.
set-aside-too_many_cells-short = Too many cells
set-aside-no_start_date = The start of follow-up is blank.
set-aside-no_start_date-short = No start date
set-aside-unreadable_start_date = “{ $written }” is not a date for the start.
set-aside-unreadable_start_date-short = Start is not a date
set-aside-partial_start_date = The start, “{ $written }”, lacks the day or the month.
set-aside-partial_start_date-short = Start without day or month
set-aside-impossible_start_date = There is no such day as “{ $written }”.
set-aside-impossible_start_date-short = Start is no such day
set-aside-start_after_closing = It starts on { $start }, after the closing date.
set-aside-start_after_closing-short = Starts after the closing date
set-aside-no_outcome = How it ended is blank.
set-aside-no_outcome-short = Ending is blank
set-aside-outcome_without_meaning = “{ $value }” was given no meaning.
set-aside-outcome_without_meaning-short = Ending without a meaning
set-aside-unreadable_end_date = “{ $written }” is not a date for the end.
set-aside-unreadable_end_date-short = End is not a date
set-aside-partial_end_date = The end, “{ $written }”, lacks the day or the month.
set-aside-partial_end_date-short = End without day or month
set-aside-impossible_end_date = There is no such day as “{ $written }”.
set-aside-impossible_end_date-short = End is no such day
set-aside-no_end_date = Follow-up ended, but not when.
set-aside-no_end_date-short = Ended without a date
set-aside-end_before_start = It ends on { $end }, before it starts on { $start }.
set-aside-end_before_start-short = Ends before it starts
set-aside-birth_after_start = Born on { $birth }, after the start on { $start }.
set-aside-birth_after_start-short = Born after the start
set-aside-unreadable_observed_from = “{ $written }” is not a date for the first visit here.
set-aside-unreadable_observed_from-short = First visit here is not a date
set-aside-partial_observed_from = The first visit here, “{ $written }”, lacks the day or the month.
set-aside-partial_observed_from-short = First visit here without day or month
set-aside-impossible_observed_from = There is no such day as “{ $written }”.
set-aside-impossible_observed_from-short = First visit here is no such day
set-aside-before_observed_from = It ends on { $end }, before the first visit here on { $observed_from }.
set-aside-before_observed_from-short = Ends before the first visit here
set-aside-no_time_at_risk = First seen here and last seen on the same day, { $observed_from }: no time was observed.
set-aside-no_time_at_risk-short = No time observed
set-aside-duplicate_number = The patient number stands on line { $first_line } already.
set-aside-duplicate_number-short = Patient number repeated

changed-under_care_to_closing = Under care without a last contact: followed to the closing date.
changed-under_care_to_closing-short = Under care, followed to the closing date
changed-observed_before_start = First seen here on { $observed_from }, before the start: observed from the start.
changed-observed_before_start-short = First seen before the start
changed-followed_past_closing = Ends on { $end }, after the closing date: still under care on that date.
changed-followed_past_closing-short = Ended after the closing date: under care on it

caution-age_out_of_range = { $n } ages below 0 or above { $oldest } count as not recorded.
caution-all_censored = None of the { $n } patients died. Survival cannot fall; look at another outcome, or check what the values mean.
caution-all_set_aside = Every row was set aside ({ $rows }). Look at the reasons: most likely a column or the way dates are written was chosen wrongly.
caution-birth_dates_unreadable = { $n } dates of birth in “{ $heading }” could not be read; age counts as not recorded there.
caution-buddhist_years = { $n } years in “{ $heading }” are counted from the Buddhist era; 543 was taken off.
caution-closing_long_after_last = The last date in the file is { $last }, { $days } days before the closing date. Is the closing date right?
caution-dates_against_order = { $n } dates in “{ $heading }” do not fit the order of the others and were set aside.
caution-day_zero = { $n ->
    [one] One patient was last seen
   *[other] { $n } patients were last seen
  } on the very day follow-up started (lines { $lines }…).
caution-doubled_headings = These headings stand more than once: { $headings }.
caution-encoding_assumed = The letters were taken to be written as { $encoding }. If names look wrong, save the file as UTF-8.
caution-formulas_without_value = { $n } cells hold a formula without a stored value and were read as blank. Open and save the workbook in its spreadsheet program first.
caution-hidden_columns = { $n } columns are hidden in the workbook; they were read.
caution-hidden_rows = { $n } rows are hidden or filtered in the workbook; they were read.
caution-hidden_sheets = The workbook has hidden sheets: { $sheets }.
caution-long_rows = { $n ->
    [one] One row has
   *[other] { $n } rows have
  } more cells than there are headings (lines { $lines }…): columns may have shifted there.
caution-many_after_closing = { $n } patients start after the closing date. Is it right?
caution-many_levels = “{ $heading }” has { $levels } different values: too many to compare groups by.
caution-merged_cells = { $n } merged cells: only the first cell of each holds the value.
caution-no_headings = There are no headings; columns are numbered.
caution-nul_bytes = { $n } empty (NUL) characters were left out.
caution-number_style_unsettled = In “{ $heading }” a comma or point may part thousands or decimals; “{ $decimal }” was taken for decimals.
caution-one_patient_only = Only one patient is left. Results are for groups.
caution-order_against_evidence = The chosen order for “{ $heading }” ({ $order }) goes against the dates that stand in it.
caution-preamble = { $n ->
    [one] One line above the headings was left out.
   *[other] { $n } lines above the headings were left out.
  }
caution-quotes_unbalanced = A quotation mark that opens on line { $line } is never closed; quotation marks were read as ordinary letters.
caution-repeated_headings = The headings are repeated within the list ({ $n }); those rows are no patients.
caution-sex_without_meaning = { $n } rows have a sex that was given no meaning ({ $values }).
caution-short_rows = { $n ->
    [one] One row has
   *[other] { $n } rows have
  } fewer cells than there are headings (lines { $lines }…); the rest was read as blank.
caution-subtotal_rows = Rows with totals were found ({ $n }); they are no patients.
caution-text_in_numbers = In “{ $heading }”, { $n } cells are not numbers ({ $examples }) and count as not recorded.
caution-two_digit_years = { $n } years with two digits ({ $headings }) were taken as lying between { $first } and { $last }.
caution-unnamed_columns = Columns without a heading: { $columns }.
caution-unreadable_characters = { $n } characters could not be read.
caution-unseen_for_long = { $n ->
    [one] One patient counts
   *[other] { $n } patients count
  } as under care but were last seen over { $days } days before the closing date (lines { $lines }…). They may be lost.
caution-values_not_listed = Only the { $listed } commonest of { $distinct } values are listed; the others have no meaning.
caution-list_shortened = { $listed } of { $n } rows are listed; all are counted.
caution-levels_not_listed = { $covariate } has { $levels } values; { $listed } are listed.

refusal-compressed_file = This is a compressed file. Unpack it and open the list inside.
refusal-date_order_unsettled = Choose how the dates in “{ $heading }” are written: nothing in them shows whether the day or the month comes first.
refusal-empty_file = The file is empty.
refusal-file_too_large = The file is larger than this page can open (the limit is 200 MB). Save only the list of patients in a file of its own.
refusal-no_end_column = Choose the column with the last contact or end.
refusal-no_outcome_column = Choose the column that says how it ended.
refusal-no_start_column = Choose the column with the start of follow-up.
refusal-no_readable_dates = Nothing in “{ $heading }” can be read as a date (for example { $examples }). Choose another column for the start.
refusal-no_such_line = Line { $given } holds no headings.
refusal-no_such_sheet = The workbook has no sheet “{ $given }”.
refusal-not_a_table = This is not a list that can be read. Save it from its program as .xlsx or .csv.
refusal-not_text = This is not a text file or a workbook. Save the list from its program as .xlsx or .csv.
refusal-not_a_date = “{ $given }” is not a date.
refusal-role_given_twice = More than one column is used as “{ $role }”. Choose one.
refusal-too_many_cells_in_file = The list has more than { $most } cells, which is more than this page can hold.
refusal-too_many_columns = The list has { $columns } columns; at most { $most } can be read.
refusal-too_many_rows = The list has more than { $most } rows, which is more than this page can hold.
refusal-unknown_column = The file has no such column.
refusal-workbook_binary = This is a binary workbook (.xlsb). Save it as .xlsx.
refusal-workbook_bomb = This workbook unpacks to { $ratio } times its size, which no list of patients does. It was not opened.
refusal-workbook_damaged = The workbook is damaged and cannot be read. Open it in its spreadsheet program and save it again.
refusal-workbook_encrypted = The workbook is protected with a password. Save a copy without one, and delete that copy afterwards.
refusal-workbook_entities = The workbook contains definitions that no spreadsheet program writes. It was not opened.
refusal-workbook_macros = The workbook contains macros. Save it as .xlsx, without macros.
refusal-workbook_old_form = This is a workbook of the old kind (.xls). Save it as .xlsx.
refusal-workbook_too_large = The workbook unpacks to more than this page can hold. Save only the list of patients in a workbook of its own.
refusal-workbook_too_many_parts = The workbook has { $parts } parts, more than any list of patients needs. It was not opened.
refusal-workbook_without_sheets = The workbook has no sheets with cells.

## Outcomes

outcomes-title = What became of the patients
outcomes-lead = Choose which endings count as the outcome, and if you like a column to compare groups by. Everything below follows.

axis-years-since-start = Years since start
row-atRisk = At risk
row-events = Events
row-censored = Censored
group = Group
years-since-start = Years since start
standard-error = Standard error
lost = Lost
events-so-far = Outcomes so far
censored-so-far = Censored so far
beyond-follow-up = beyond follow-up
count-share = { $count } ({ $share })
from-to = { $lower } to { $upper }
sentence-group = { $group }: {""}
levels-left-out = Left out because nobody is in them: { $levels }.

survival-title = Survival over time
survival-sentence-deaths = { $group }{ $survival } were alive { $years ->
    [one] { $years } year
   *[other] { $years } years
  } after starting (95% interval { $interval }), judging from { $n } patients and { $events } deaths.
survival-sentence-other = { $group }{ $survival } were free of the chosen outcome { $years ->
    [one] { $years } year
   *[other] { $years } years
  } after starting (95% interval { $interval }), judging from { $n } patients and { $events } outcomes.
survival-sentence-short = { $group }follow-up of these { $n } patients is shorter than one year; read the curve as far as it goes.
median-reached = Half had met it by { $median } years (95% interval { $lower } to { $upper }).
median-reached-open = Half had met it by { $median } years (95% interval from { $lower }; its upper limit was not reached).
median-unsupported = Half had met it only after fewer than 10 were still followed, so no median is given.
median-not-reached = Fewer than half had met it by the end of follow-up, so there is no median.
survival-figure-deaths = Share still alive, by years since start
survival-figure-other = Share still free of the outcome, by years since start
survival-figure-described = { $curves ->
    [one] A falling step curve with its 95% band; the numbers at risk stand below it, and the table behind the figure holds every value.
   *[other] { $curves } falling step curves with their 95% bands; the numbers at risk stand below them, and the table behind the figure holds every value.
  }
survival-counts-caption = At risk, outcomes and censored at each year
survival-at-years-caption = Survival at chosen times, with 95% limits
survival-heading-deaths = Alive
survival-heading-other = Free of the outcome
losses-caption = What those lost to follow-up could change
losses-note = The truth lies between the two columns. The curve above takes those lost to be like those who stayed; if that is doubtful, quote both columns.
if-all-lost-died = If all lost had met the outcome at last contact
if-none-lost-died = If none had, up to the closing date
no-losses = Nobody was lost to follow-up, so losses change nothing here.
interval-kind = Kind of confidence interval
interval-log-log = log-log (usual choice)
interval-log = log
interval-plain = plain
survival-method = Product limit (Kaplan & Meier 1958), Greenwood's variance (1926), { $interval } limits; where the curve has not moved from 100% or has reached 0%, beta-product limits (Fay and others 2013). Outcomes come before censorings on the same day. The median is the first time the curve is at or below 50% (Brookmeyer & Crowley 1982). Drawn while at least 10 are at risk; short strokes mark patients censored.

life-table-title = Life table
life-table-caption = Actuarial life table
life-table-caption-group = Actuarial life table: { $group }
life-table-step = Length of the intervals
step-year = Years
step-quarter = Quarters
step-month = Months
interval-years = Years
interval-months = Months
interval-from-to = { $from } to { $to }
entering = Entering
withdrawn = Otherwise withdrawn
events = Outcomes
effective = Effective number
chance = Chance in interval
odds = Odds in interval
survival-to-end = Survival to end (95% limits)
hazard-per-year = Hazard per year
life-table-method = Actuarial method (Berkson & Gage 1950; Cutler & Ederer 1958): those lost or withdrawn in an interval count for half of it. Greenwood's standard error; hazard at the middle of the interval (Gehan 1969).

leaving-title = Every way of leaving
leaving-sentence = { $group }after { $years ->
    [one] { $years } year
   *[other] { $years } years
  }, { $stayed } were still under care; the commonest way of leaving was “{ $way }”, with { $share }.
leaving-sentence-nobody = { $group }nobody has left yet.
leaving-figure = Where the patients are, by years since start: { $group }
leaving-figure-described = A stacked area: those still under care at the bottom, above them { $ways ->
    [one] one way of leaving
   *[other] { $ways } ways of leaving
  }, together always 100%. The table below holds the values.
leaving-caption = Cumulative incidence of each way of leaving, with 95% limits: { $group }
leaving-note = The last column shows what one minus survival would wrongly say, as if the other ways of leaving did not exist. Do not quote it.
way-of-leaving = Way of leaving
events-in-all = In all
by-years = By { $years ->
    [one] { $years } year
   *[other] { $years } years
  }
one-minus-survival = One minus survival at { $years } (too high)
leaving-method = Aalen & Johansen (1978), all ways of leaving at once; variance as in Marubini & Valsecchi (1995).

refusal-no_patients = There are no patients to describe.
refusal-one_patient = One patient alone is not described here: results are for groups. Look at the record itself.
refusal-nobody_at_risk = Nobody was under observation for even a day, so nothing can be said about time.
refusal-too_many_groups = { $covariate } has { $groups } groups; at most { $most } can be told apart. Merge some in the register first, or choose another column.
refusal-groups_too_small = No group of { $covariate } has at least two patients. Choose another column.
caution-no_events = { $level }: nobody of { $n } met the outcome. The curve stays at 100%; its lower limit shows how low it could still be.
caution-all_events_on_day_zero = { $level }: all { $events } outcomes fell on the first day. Check whether the dates of start and end were mixed up.
caution-last_at_risk_had_event = { $level }: the curve falls to 0 because the very last patient under observation met the outcome. Do not read its end.
caution-never_at_risk = { $level }: { $n } with a late first visit began and ended observation on one day, and count nowhere.
caution-begins_late = { $level }: nobody was under observation before day { $days }. The curve speaks only of those who had come that far.
caution-risk_set_emptied = { $level }: for a time nobody was under observation (last after day { $emptied_days }); the curve starts again on day { $restart_days } and speaks of those who had come that far.
caution-few_patients = { $level }: only { $n } patients. One more or one fewer would change the figures a great deal.
caution-few_at_risk = { $level }: fewer than 10 were still at risk at { $years } years ({ $at_risk }). Do not lean on the figure there.
caution-many_lost = { $level }: { $lost } were lost to follow-up ({ $share }). If they fared worse than those who stayed, the true survival is lower: quote the bounds as well.
caution-all_lost = { $level }: all { $n } were lost, so only the bounds can be given.
caution-lost_is_of_interest = Being lost counts as the outcome here; the bounds for losses then mean nothing.
caution-few_effective = { $level }: fewer than 10 effectively at risk in the interval beginning on day { $from_days }. Read no further than there.
caution-nobody_left = { $level }: nobody of { $n } has left yet.
caution-group_not_recorded = { $n ->
    [one] One patient has nothing recorded in the grouping column and is in no group.
   *[other] { $n } patients have nothing recorded in the grouping column and are in no group.
  }

rates-title = How often
rates-by = By
rates-by-year = calendar year
rates-by-since_start = years since start
rates-by-age = age
rates-sentence = { $group }: { $events } outcomes in { $years } person-years, { $rate } for each { $per } person-years (95% interval { $interval }).
rates-sentence-compared = { $group }: { $events } outcomes in { $years } person-years, { $rate } for each { $per } person-years (95% interval { $interval }), { $ratio } times the rate of { $first } ({ $ratioInterval }).
rates-do-not-mean = A rate counts outcomes for the time people were observed; it is not the share who will have had the outcome, and an average over years in which the risk changes can hide that.
rates-figure = Outcomes for each { $per } person-years, with 95% limits
rates-figure-described = Rates in { $bands ->
    [one] one band
   *[other] { $bands } bands
  } for { $groups ->
    [one] everyone together
   *[other] { $groups } groups
  }; the numbers are in the table.
rates-caption = Outcomes for each { $per } person-years
rates-band = In
rate-per = Rate for each { $per } (95% limits)
band-from = { $from } and over
rates-standardised-caption = Age-standardised rates for each { $per } person-years
rates-crude = Crude
standard-who_world = WHO world standard 2000-2025
standard-segi = Segi world standard
rates-unknown-age = { $n ->
    [one] One patient without an age is in none of the ages.
   *[other] { $patients } patients without an age are in none of the ages.
  }
rates-method = Time is cut at each band (Lexis); limits of a rate Garwood (1936), of a ratio exact and conditional on all outcomes; standardised directly, limits Fay & Feuer (1997). Weights of the WHO standard: Ahmad and others (2001).
caution-few_events_in_rate = { $level }: only { $events } outcomes, so one patient more or less moves the rate noticeably.
caution-standard_cut_short = Ages that hold { $share } of the standard's weight were seen; the standard was cut to these, so the figure can only be compared with others cut in the same way.
caution-standard_thin = Ages in which fewer than 10 person-years were lived hold { $share } of the standard's weight: one outcome there moves the standardised rate greatly, and its upper limit says how little is known.
refusal-age_not_known = The register has no age. Choose a column with the age or the date of birth in Register.
refusal-uneven_weights = A standard needs one weight for each age band.

mean-time-title = How long on average, and what lies ahead
mean-time-empty = Type a number of years.
mean-time-horizon = Up to so many years
mean-time-horizon-hint = To be chosen before looking. Left empty: five years, or as far as all groups go.
mean-time-further = Looking ahead, years
mean-time-sentence-deaths = { $group }: within { $horizon } years patients lived { $mean } years on average (95% interval { $interval }).
mean-time-sentence-other = { $group }: within { $horizon } years patients spent { $mean } years without the outcome on average (95% interval { $interval }).
mean-time-sentence-compared-deaths = { $group }: within { $horizon } years patients lived { $mean } years on average (95% interval { $interval }), { $difference } years in difference from { $first } ({ $between }).
mean-time-sentence-compared-other = { $group }: within { $horizon } years patients spent { $mean } years without the outcome on average (95% interval { $interval }), { $difference } years in difference from { $first } ({ $between }).
mean-time-caption = Averages within { $horizon } years (95% limits)
mean-time-deaths = Years lived
mean-time-other = Years without the outcome
mean-time-lost = Years lost
mean-time-difference = Difference from the first
ahead-caption-deaths = Alive { $years } years later, of those who had come so far
ahead-caption-other = Without the outcome { $years } years later, of those who had come so far
ahead-survived = Years since start
ahead-share = Share (95% limits)
ahead-few_survivors = fewer than 10 left
ahead-beyond_follow_up = beyond follow-up
mean-time-does-not-mean = An average within a horizon needs no hazards in constant proportion, so it can be compared when curves cross; it says nothing of later years.
mean-time-method = Area under the product-limit curve (Irwin 1949; Royston & Parmar 2013); conditional survival with Greenwood's variance of the later years (Zabor and others 2013).
refusal-horizon_beyond_follow_up = Not everyone's curve goes so far: the shortest ends after { NUMBER($years, maximumFractionDigits: 1) } years. Choose an earlier year.
refusal-curve_restarts = Nobody was under observation for some time, so the curve does not go through from the start and has no average.

tipping-title = If the lost fared otherwise
tipping-years = Survival at so many years
tipping-sentence = { $group }, { $lost } of { $n } lost: { $alike } free of the outcome at { $years } years if the lost fared like those who stayed, { $double } if their hazard doubled, { $most } if it was { $times } times as high.
tipping-clear-tips = The difference between { $group } and { $first } is no longer clear if those lost from { $better } had about { $times } times the hazard of those who stayed.
tipping-clear-holds = The difference between { $group } and { $first } stays clear even if those lost from { $better } had { $times } times the hazard of those who stayed.
tipping-unclear-tips = No clear difference between { $group } and { $first } as it stands; there would be one if those lost from { $better } had about { $times } times the hazard of those who stayed.
tipping-unclear-holds = No clear difference between { $group } and { $first }, nor would there be one if those lost from { $better } had { $times } times the hazard of those who stayed.
tipping-does-not-mean = Nobody knows how the lost fared unless some are traced. Ask of each multiple whether it could be true here.
tipping-figure = Free of the outcome at { $years } years, by how the lost fared
tipping-figure-described = { $groups ->
    [one] A line with its 95% band that falls as the lost are supposed to have fared worse; the table below holds the values.
   *[other] { $groups } lines with their 95% bands that fall as the lost are supposed to have fared worse; the table below holds the values.
  }
axis-delta = Hazard of the lost (times)
tipping-delta = Hazard of the lost, times that of those who stayed
tipping-caption = Free of the outcome at { $years } years (95% limits), by the hazard of the lost
tipping-method = The lost stay at risk after their last visit with a hazard so many times that of the others (Zhao and others 2014; Lipkovich and others 2016), worked out as an expectation. Limits from { $resamples } resamples of the patients, seed { $seed }. At 1 it is the product limit; even 10 is not the worst case, which stands beside the curve above.
caution-left_out_of_tipping = { $level } is left out here: fewer than { $least } outcomes by then, or nobody followed from the start so far.
refusal-too_few_to_tip = By { $years } years no group has { $least } outcomes and follow-up from the start. Choose another year, or rely on the bounds beside the curve.
refusal-lost_is_the_outcome = Being lost is one of the outcomes counted, so nothing about the lost is unknown here.

## Compare

compare-title = Compare

compare-lead = Whether one group did better than another, first plainly, then with what else differs between them taken into account. None of this shows that the group was the cause.
compare-choose-group = Choose a column to group by, above.
compare-exposed = Group in question
compare-reference = Compared with
patients = Patients
measure = Measure
p-value = p
test = Test
chi-squared = Chi-squared
degrees-of-freedom = Degrees of freedom

difference-title = The difference in survival
difference-sentence = After { $years ->
    [one] { $years } year
   *[other] { $years } years
  }, { $inExposed } in “{ $exposed }” and { $inReference } in “{ $reference }” were free of the outcome: a difference of { $difference } percentage points (95% interval { $interval }).
difference-caption = Free of the outcome at chosen times, and the difference
difference-points = Difference, percentage points
difference-method = Difference of two product-limit estimates; the variances of the two groups are added (Greenwood 1926). Nothing is adjusted for.

rank-test-title = Could the curves differ by chance?
rank-sentence-differ = Over the whole of follow-up the groups differ more than chance would easily explain (chi-squared { $chi }, { $df ->
    [one] { $df } degree
   *[other] { $df } degrees
  } of freedom, p { $p }).
rank-sentence-may-be-chance = Over the whole of follow-up, chance alone could explain the difference between the groups (chi-squared { $chi }, { $df ->
    [one] { $df } degree
   *[other] { $df } degrees
  } of freedom, p { $p }).
rank-does-not-mean = The p-value is not the size of a difference, and a large one does not show that the groups are alike.
rank-caption = Outcomes observed, and expected if all groups had the same hazards
observed = Observed
expected = Expected
observed-to-expected = Observed / expected
rank-weight = Weight given to each time
rank-weight-hint = Choose it before looking at the result.
rank-log_rank = Equal: log-rank
rank-gehan = Number at risk: Gehan
rank-tarone_ware = Its square root: Tarone-Ware
rank-fleming_harrington = Powers of survival: Fleming-Harrington
rank-method-log_rank = Log-rank test (Mantel 1966; Peto & Peto 1972), hypergeometric variance.
rank-method-gehan = Gehan's generalised Wilcoxon test: weights are the numbers at risk, so early differences count more.
rank-method-tarone_ware = Tarone & Ware (1977): weights are square roots of the numbers at risk.
rank-method-fleming_harrington = Fleming & Harrington (1991), weight S(t−)^{ $rho } (1 − S(t−))^{ $gamma }, S pooled over the groups.
rank-peto_peto = Survival so far, Peto and Peto’s
rank-rho = Power of survival so far
rank-rho-hint = Above 0: early differences count more.
rank-gamma = Power of what has been lost
rank-gamma-hint = Above 0: late differences count more.
rank-power-fault = Between 0 and { $greatest }.
rank-stratify = Compare within levels of
rank-stratify-hint = Patients are compared only with those of the same level.
rank-stratify-none = No column
rank-ordered = Have the groups an order?
rank-ordered-hint = Only an order known before looking.
rank-ordered-no = No
rank-ordered-yes = Yes, by scores
rank-score-of = Score of “{ $level }”
rank-score-fault = A number is missing.
rank-stratified = Compared within levels of “{ $covariate }”: p { $p }. Without that: p { $crude }. If these disagree, the column explains part of the difference, or hid it.
rank-trend-up = Along the order of the groups outcomes come faster the higher the score (z { $z }, p { $p }).
rank-trend-down = Along the order of the groups outcomes come more slowly the higher the score (z { $z }, p { $p }).
rank-trend-chance = Chance alone could explain what there is of a trend along the order of the groups (z { $z }, p { $p }). A middle group can still differ from both ends.
rank-pairs-caption = Each pair of groups by itself, and adjusted because { $n ->
    [one] { $n } pair is
   *[other] { $n } pairs are
  } compared
rank-pair = Groups
rank-pair-of = { $first } and { $second }
adjusted-p = p, adjusted
not-tested = not tested
rank-method-peto_peto = Peto & Peto’s generalised Wilcoxon test (1972): weights are the product of 1 − d/(n + 1), so early differences count more.
rank-method-stratified = Scores and variances are summed over the strata.
rank-method-trend = Test for trend by Tarone (1975).
rank-method-pairs = Pairs adjusted by Holm (1979).
caution-curves_cross = The curves of “{ $first }” and “{ $second }” cross at about { NUMBER($years, maximumFractionDigits: 1) } years; before that “{ $above }” was above. One test or one ratio for the whole of follow-up hides this: compare at chosen times, or by the average time within a horizon.
caution-stratum_not_recorded = { $n ->
    [one] { $n } patient has
   *[other] { $n } patients have
  } nothing in the column to compare within, and { $n ->
    [one] is
   *[other] are
  } left out.
caution-strata_say_nothing = { $n ->
    [one] One level says
   *[other] { $n } levels say
  } nothing, because only one group is there or nobody had the outcome: { $strata }. Merge levels if there are many.
refusal-stratified_by_itself = Groups cannot be compared within levels of the column that makes them. Choose another column.
refusal-score_missing = “{ $level }” has no score. Give every group a number.
refusal-scores_alike = All groups have the same score, so there is no order. Give them different numbers.

intervals-title = Interval by interval
intervals-lead = Of those who began each interval in “{ $exposed }” and in “{ $reference }”, how many met the outcome in it. Those lost or withdrawn in an interval count for half of it.
intervals-caption = Outcomes of effective numbers in each interval of follow-up (95% limits)
risk-ratio = Risk ratio
odds-ratio = Odds ratio
risk-difference = Risk difference, percentage points
intervals-left-out = Left out of the pooled figures because a group or an outcome is missing in them: { $intervals }.
intervals-method = Effective numbers n − w/2 (Cutler & Ederer 1958); risk ratio limits Katz (1978), odds ratio Woolf (1955), risk difference Newcombe (1998); pooled over intervals by Mantel & Haenszel (1959) with variances of Robins, Breslow & Greenland (1986) and Greenland & Robins (1985).
pooled-caption = Pooled over the strata (Mantel-Haenszel, 95% limits)
pooled-sentence = Pooled, the risk in “{ $exposed }” was { $ratio } times that in “{ $reference }” (95% interval { $interval }; p { $p }).
odds-are-not-risks = An odds ratio is not a ratio of risks: when the outcome is common it lies further from 1. Quote the risk ratio and the risk difference to people.
crude = Crude
pooled = Pooled
strata-agree = The strata agree well enough to be pooled (Breslow-Day with Tarone's correction: chi-squared { $chi }, degrees of freedom { $df }, p { $p }).
strata-differ = The strata differ from one another (Breslow-Day with Tarone's correction: chi-squared { $chi }, degrees of freedom { $df }, p { $p }): read them one by one; the pooled figure hides the difference.

cox-title = Taking other things into account
cox-choose-covariates = Tick what to take into account.
cox-covariates = Take into account
cox-covariates-hint = Only what was known at the start. Leave out what the group itself may have changed.
cox-reference = { $covariate }: compared with
cox-per = { $covariate }: per
cox-ties = Outcomes on the same day
cox-ties-efron = Efron (usual choice)
cox-ties-breslow = Breslow
cox-term-level = { $covariate }: { $level } against { $reference }
cox-term-number = { $covariate }, per { $per }
cox-sentence-higher = { $term }: the outcome came sooner; at any time its hazard was { $ratio } times as high (95% interval { $interval }; p { $p }){ $others ->
    [0] , nothing else taken into account.
   *[other] , with the other covariates held equal.
  }
cox-sentence-lower = { $term }: the outcome came later; at any time its hazard was { $ratio } times as high (95% interval { $interval }; p { $p }){ $others ->
    [0] , nothing else taken into account.
   *[other] , with the other covariates held equal.
  }
cox-sentence-unclear = { $term }: no clear difference; the hazard ratio is { $ratio }, but anything in { $interval } fits these data (p { $p }){ $others ->
    [0] , nothing else taken into account.
   *[other] , with the other covariates held equal.
  }
cox-does-not-mean = A hazard ratio is neither a ratio of risks nor of odds, and says nothing of how many: read it together with the difference in survival above.
cox-figure = Hazard ratios with 95% limits
cox-figure-described = { $terms ->
    [one] One hazard ratio with its limits
   *[other] { $terms } hazard ratios with their limits
  } on a logarithmic scale; the table below holds the values.
axis-hazard-ratio = Hazard ratio (1 = no difference)
cox-caption = Cox regression
covariate = Covariate
coefficient = Coefficient
hazard-ratio = Hazard ratio (95% limits)
cox-fit = { $n } patients, { $events } outcomes. Concordance { $concordance }: the share of pairs of patients that the model puts in the right order.
cox-tests-caption = Tests of the whole model
test-likelihood_ratio = Likelihood ratio
test-wald = Wald
test-score = Score
proportional = The hazard ratios may be taken as constant over time (score test of proportional hazards: chi-squared { $chi }, degrees of freedom { $df }, p { $p }).
not-proportional = The hazard ratios change over time (score test of proportional hazards: chi-squared { $chi }, degrees of freedom { $df }, p { $p }): each is only an average, and the difference in survival above says more.
cox-left-out = Left out because they do not vary or repeat what others already say: { $covariates }.
cox-method-efron = Cox (1972), ties by Efron (1977), Wald limits; proportional hazards by the score test of Grambsch & Therneau (1994).
cox-method-breslow = Cox (1972), ties by Breslow (1974), Wald limits; proportional hazards by the score test of Grambsch & Therneau (1994).

caution-few_events_in_group = { $level }: only { $events ->
    [0] no outcomes
    [one] one outcome
   *[other] { $events } outcomes
  }. The comparison hangs on one or two patients.
caution-common_in_interval = The outcome is common within intervals (up to { $share }): do not read the pooled odds ratio as a hazard ratio or a ratio of risks.
caution-strata_differ = The strata differ from one another (p { NUMBER($p, maximumFractionDigits: 3) }): look at them one by one before quoting a pooled figure.
caution-half_added = { $strata ->
    [one] In one stratum
   *[other] In { $strata } strata
  } a cell is empty; one half was added there for Woolf's test.
caution-few_events = Only { $events } outcomes for { $parameters } coefficients: fewer than 10 for each. Take less into account, or read the result as a hint.
caution-not_proportional = The hazard ratios change over time (p { NUMBER($p, maximumFractionDigits: 3) }). One number for the whole of follow-up hides that; look at the curves.
caution-covariate_missing = { $n ->
    [one] One patient
   *[other] { $n } patients
  } with something missing were left out; if they differ from the others, the result leans.
refusal-one_group = There is only one group. Choose a column with two groups or more.
refusal-no_events_to_compare = Nobody met the outcome, so there is nothing to compare.
refusal-nothing_to_compare = At no time were two groups under observation together, so they cannot be compared.
refusal-same_group = Choose two different groups.
refusal-unknown_level = “{ $level }” is not a group of { $covariate } that can be compared.
refusal-no_strata = There is nothing to compare yet.
refusal-no_usable_strata = In no stratum or interval are there patients of both groups.
refusal-exact_needs_whole_numbers = Exact figures need whole numbers.
refusal-no_covariates = Tick at least one covariate.
refusal-covariate_twice = { $covariate } is there twice.
refusal-per_not_positive = The step for { $covariate } must be more than 0.
refusal-nobody_complete = No patient has all of the ticked covariates recorded. Tick fewer.
refusal-nothing_varies = { $covariate } is the same for everybody. Tick another covariate.
refusal-reference_is_empty = Nobody is in “{ $level }” of { $covariate }. Compare with another category.
refusal-too_few_events = { $events } outcomes are too few for { $parameters } coefficients: at least 3 for each are needed, better 10. Tick fewer covariates.
refusal-level_without_events = Nobody in “{ $level }” of { $covariate } met the outcome, so its hazard ratio has no end. Merge that category with another in the register, or leave the covariate out.
refusal-separation = { $covariate } separates those with the outcome from the others completely, so its hazard ratio has no end. Merge categories, or leave it out.
refusal-no_convergence = The estimates did not settle after { $steps } steps. Take fewer covariates into account, or look for one that nearly repeats another.

subdistribution-title = When other endings come first
subdistribution-competing = These rule the outcome out
subdistribution-competing-hint = Endings after which it cannot come any more. The others only end observation.
subdistribution-sentence-higher = { $term }: more had the outcome. The ratio of subdistribution hazards is { $ratio } (95% interval { $interval }), from { $events } outcomes among { $n } patients, of whom { $competing } left in a way that ruled it out.
subdistribution-sentence-lower = { $term }: fewer had the outcome. The ratio of subdistribution hazards is { $ratio } (95% interval { $interval }), from { $events } outcomes among { $n } patients, of whom { $competing } left in a way that ruled it out.
subdistribution-sentence-unclear = { $term }: no clear difference in how many had the outcome. The ratio of subdistribution hazards is { $ratio }, but anything in { $interval } fits these data ({ $events } outcomes among { $n } patients, of whom { $competing } left in a way that ruled it out).
subdistribution-does-not-mean = This ratio tells in which direction the chance of the outcome moves, counting what comes first; it is not a ratio of chances. The cause-specific ratios tell what happens among those still under care. A group can seem safer here only because its patients leave in another way sooner: read the three columns together.
subdistribution-caption = Ratios with 95% limits
subdistribution-ratio = Subdistribution hazard ratio
subdistribution-of-interest = Cause-specific hazard ratio
subdistribution-of-competing = Cause-specific hazard ratio of what rules it out
subdistribution-too-few-competing = Too few left in a way that rules the outcome out for a model of their own.
subdistribution-method = Fine & Gray (1999), ties by Breslow, sandwich variance; weights for delayed entry by Geskus (2011). Cause-specific: Cox (1972), ties by Efron.
caution-no_competing = Nobody left in a way that rules the outcome out, so the subdistribution hazard is the plain hazard.
refusal-competing_is_interest = “{ $meaning }” cannot be the outcome and rule it out as well.
refusal-weights_undefined = At some time nobody was under observation who could stand for those who came later, so the weights of this model are not defined. Leave out the delayed entries, or look at the cause-specific results.

compare-known = When was it known who belongs to which group?
compare-known-hint = A group that is made by something after the start (a treatment begun, a visit kept) had to be lived into.
compare-known-start = at the start of follow-up
compare-known-later = only later
compare-landmark = Count from so many months after the start
compare-landmark-hint = Only those still followed then are compared, in the groups known by then.
alike-title = Are the groups alike?
alike-sentence = { $exposed } ({ $exposedPatients } patients) and { $reference } ({ $referencePatients }) differ noticeably in { $unlike } of { $of } characteristics.
alike-sides-caption = How the groups were followed
alike-start = Half had started by
alike-follow-up = Median follow-up, years
alike-lost = Lost to follow-up
alike-caption = Characteristics of the groups
alike-method = Means with standard deviations, counts with shares; standardised differences (Austin 2009), above 0.1 worth taking into account (common practice). Follow-up by the reversed product limit.
characteristic = Characteristic
mean-of = { $covariate }, mean (standard deviation)
level-of = { $covariate }: { $level }
mean-and-spread = { $mean } ({ $spread })
count-and-share = { $n } ({ $percent })
standardised-difference = Standardised difference
e-value = To explain this away, something not in the register would have to go along with both the group and the outcome by risk ratios of { $estimate } each, over and above what was taken into account; to make the difference unclear, by { $limit } each{ $scale ->
    [common]  (the outcome is common, so the ratio was first brought to the scale of risks)
   *[other] {""}
  }. E-value: VanderWeele & Ding (2017).
e-value-of-unclear = The difference is unclear already, so nothing hidden is needed to explain it away (E-value of the limit { $limit }, of the estimate { $estimate }{ $scale ->
    [common] , on the scale of risks
   *[other] {""}
  }; VanderWeele & Ding 2017).
compare-found = How were the patients found?
compare-found-hint = For example by screening or a search for cases, or because they fell ill.
compare-found-alike = In the same way in all groups
compare-found-differently = In different ways
caution-found_differently = The groups were found in different ways. Those found by looking for the illness are found earlier, so they live longer from then on even if nothing helped them (lead time), and a search finds more of the slow cases. Compare within the levels of a column that says how they were found, or count from an event that is the same for all.
caution-group_timing_not_said = It was not said when the groups became known. If they were made by something after the start, those in the group had to live until then, and the comparison flatters it.
caution-counted_from_landmark = Counted from { $days } days after the start, among those still followed then. A group entered after that day must not be used here.
caution-groups_unlike = The groups differ in { $covariates } (standardised difference up to { NUMBER($most, maximumFractionDigits: 2) }). Take these into account before believing a difference in outcome.
caution-periods_differ = Half of { $level } started { NUMBER($years, maximumFractionDigits: 1) } years before the other group: care may have changed in between. Take the period of the start into account.
caution-follow_up_differs = { $level } was followed { NUMBER($times, maximumFractionDigits: 1) } times as long: compare only as far as both were followed.
caution-losses_differ = More were lost from { $level } ({ $share } against { $other_share }). If the lost fared otherwise than the rest, the comparison leans.
refusal-group_known_later = Groups that became known only after the start cannot be compared from the start: those in the group had to live until then. Choose from how many months after the start to count.
refusal-nobody_at_landmark = Nobody was followed for longer than { $days } days. Choose an earlier landmark.
refusal-empty_group = Nobody is in “{ $level }”. Choose another group.

## Caseload


caseload-title = Who will be under care
caseload-lead = From the register's own newcomers and its own leaving: who will be under care, and what that takes. Rates of the past are carried forward; nothing is known of what has never happened yet.
calendar-year = Year
newcomers = Newcomers
whole-year = Wholly covered
yes = yes
no = no
person-years = Person-years
left-in-all = Left in all
staying = Stayed through it
baseline = As it is now
under-care = Under care
on-day = On
year-to = Year to
band-80 = 80% of runs
band-95 = 95% of runs
percent-sign = %
axis-years-from-closing = Years from the closing date

history-title = What the past says
newcomers-sentence = About { $mean } patients a year have come ({ $lower } to { $upper }), judging from { $years ->
    [one] one whole year
   *[other] { $years } whole years
  }.
newcomers-sentence-unknown = There is no whole year of history to judge newcomers by. Type a number below.
newcomers-figure = Newcomers by the year they were first seen here
newcomers-figure-described = Bars of newcomers for each calendar year; years not wholly covered are hollow, and a dashed line marks the yearly mean.
retention-sentence = { $staying } stayed through the first { $years ->
    [one] year
   *[other] { $years } years
  }; the commonest way of leaving then was “{ $way }” ({ $share } of those who left).
retention-sentence-nobody = Nobody has left in the first { $years ->
    [one] year
   *[other] { $years } years
  }.
retention-caption = Leaving for each 100 patient-years of care, by years since start
retention-note = From { $years } years since start on, too little has been seen: the last line is carried on.
today-caption = The { $total } patients under care at the closing date, by years since start
history-method = Newcomers: Poisson limits (Garwood 1936), widened where years differ more than chance would explain. Leaving: outcomes over person-years in each year since start, by cause.

projection-title = The coming years
projection-needs-newcomers = Type how many newcomers to expect each year.
caseload-years = Years ahead
caseload-basis = Newcomers
caseload-basis-history = as in the past
caseload-basis-typed = typed
caseload-per-year = Newcomers a year
caseload-basis-trend = the trend, damped
caseload-basis-incidence = incidence × population
caseload-damping = Damping
caseload-damping-hint = What is left of the trend after each year: 1 carries it on, 0 stops it.
caseload-incidence = New cases per 100,000 a year
caseload-population = Population
caseload-growth = Growth a year
caseload-completeness = The register holds of those under care
caseload-completeness-hint = Below 100 if patients from before the register are missing.
caseload-tail = Beyond what was seen
caseload-tail-held = the last rates go on
caseload-tail-halved = half the last rates
caseload-tail-doubled = twice the last rates
caseload-tail-nobody = nobody leaves
beyond-seen = Longer here than seen
tail-held = Beyond { $years } years since start, too little was seen: there the last rates are carried on (shaded in the figure).
tail-halved = Beyond { $years } years since start, too little was seen: there half the last rates are used, as chosen (shaded in the figure).
tail-doubled = Beyond { $years } years since start, too little was seen: there twice the last rates are used, as chosen (shaded in the figure).
tail-nobody = Beyond { $years } years since start, too little was seen: there nobody leaves, as chosen (shaded in the figure).
projection-sentence = From { $today } now, about { $value } will be under care on { $ends } (95 of 100 runs: { $lower } to { $upper }).
projection-figure = Patients under care, with bands for 50, 80 and 95 of 100 runs
projection-figure-described = A line from today's number over { $years ->
    [one] { $years } year
   *[other] { $years } years
  }, with bands that widen; the table below holds the values.
projection-caption = Patients under care at the end of each year
projection-note = { $draws } runs, seed { $seed }: the same seed gives the same bands.
projection-method = Today's patients are run forward by how long they have been here, newcomers by survival since arrival (Capocaccia & De Angelis 1997; Verdecchia and others 2002), month by month; rates and counts are redrawn in each run.

resources-title = What it takes
resources-type = Type what one patient takes, or how much there is.
resources-method = Each month's newcomers, patients in their first year, patients beyond it and events, times what was typed; bands from { $draws } runs, seed { $seed }. Beds in use on average are admissions times stay (Little 1961); on 95 days of 100 no more than the Poisson's 95th percentile are in use. Practice is taken to stay as it is.
items-lead = Whatever care takes, in your own units: visits, tests, tablets, hours, bed-days. The amounts are for one patient.
items-caption = What one patient takes
item-name = What
item-unit = Unit
item-at_start = Once, at the start
item-first_year = Each month in the first year
item-later = Each month later
item-per_event = At each event
item-event = Event
item-unit_cost = Cost of one unit
item-cost_growth = Cost grows % a year
item-number = row { $number }
event-death = death
event-lost = loss to follow-up
event-completed = recovery or completion
event-stopped = stopping by choice
event-moved_away = moving away
lines-caption = How much there is
line-name = Name
line-what = Of what
line-limit = There is
line-patients = Patients under care at once
line-amount = { $name }, amount a month
line-beds = { $name } as bed-days: number of beds
line-unnamed = This line
line-need = { $name }: needed
line-need-now = Needed in the first month
line-need-last = Needed in the last month
line-passed-in = Passed in the month
line-passed-by = Passed by then
line-passed-by-end = Passed by the end
line-unlikely = Passed in 1 of 10 runs by
line-likely = Passed in half of the runs by
line-sentence-likely = { $name }: as likely as not, there is no longer enough from month { $month } ({ $ends }) on; by the end that has happened in { $chance } of the runs.
line-sentence-unlikely = { $name }: probably enough, but in one run of ten not from month { $month } ({ $ends }) on; by the end that has happened in { $chance } of the runs.
line-sentence-never = { $name }: enough in nearly every run; by the end there was too little in { $chance } of them.
month-on = { $month } ({ $ends })
capacity-figure = How likely it is that there has been too little, by month
capacity-figure-described = A line for each thing that is limited, rising from 0 as the share of runs in which it has been too little grows; a dotted line marks half.
capacity-by-month = Needed and passed, month by month
capacity-caption = When there is no longer enough
capacity-note = A line counts as passed from the first month in which more is needed than there is, even if need falls again later.
beds-caption = Beds in use
beds-note = The average must stay clearly below the number of beds: near it, patients wait ever longer.
beds-when = When
beds-now = first month
beds-last = last month
beds-mean = On average
beds-busy = On a busy day (1 in 20)
beds-utilisation = Share in use
amount = Amount
cost = Cost
cost-sentence = Over { $years ->
    [one] { $years } year
   *[other] { $years } years
  }, at a discount of { $percent }% a year, all this will cost about { $value } (95 of 100 runs: { $lower } to { $upper }), in the currency typed.
cost-figure = Cost in each year, with ranges for 80 and 95 of 100 runs
cost-figure-described = For each year ahead a dot at the expected cost, a thick line for 80 and a thin line for 95 of 100 runs; the table below holds the values.
cost-caption = Cost in each year, in the currency typed, without discount
cost-totals-caption = Cost of the whole time, discounted
cost-totals-note = A year's cost is divided by 1 plus the discount once for each year up to its end (Drummond and others 2005).
axis-year-ahead = Year after the closing date
discount = Discount a year
discount-hint = 0, 3 and 5% are shown beside it.
in-percent = { $percent }%
item-caption = { $name } in each year
item-caption-unit = { $name } ({ $unit }) in each year
items-example-visits = Clinic visits
items-example-visits-unit = visits
items-example-medicine = Medicine
items-example-medicine-unit = tablets
items-example-beds = Ward
items-example-beds-unit = bed-days
lines-example-slots = Clinic slots a month
lines-example-ward = Beds on the ward
fault-between = From { $least } to { $greatest }.
fault-whole-between = A whole number from { $least } to { $greatest }.
fault-not-above-zero = More than 0.
fault-item-gone = That row is no longer there.
caution-beds_never_enough = { $name }: from { $start } on, more beds are in use on average than there are. No waiting list ever settles then.
refusal-no_items = Type what one patient takes, or how much there is.
refusal-line_without_item = A line about an amount or beds must name a row of what one patient takes.

difference = Difference

levers-title = Levers side by side
levers-type = Type a percentage for a lever to see it beside the baseline.
levers-lead = What if fewer were lost, or found earlier? Each row is one lever; rows with the same name act together. Levers multiply: two that each halve the losses leave a quarter.
levers-caption = Levers
levers-budget = Money for comparing
levers-budget-hint = Scenarios are ranked by what this sum would buy of each.
scenario = Scenario
lever = Lever
lever-fewer_lost = Fewer lost
lever-fewer_deaths = Fewer deaths
lever-fewer_stopped = Fewer stopping
lever-more_completed = More recovering or completing
lever-fewer_newcomers = Fewer newcomers
lever-risk_factor = Less of a risk factor
lever-found_earlier = Found earlier
lever-percent = By %
lever-from_month = From month
lever-ramp_months = Growing over months
lever-cost_at_start = Cost at the start
lever-cost_per_year = Cost a year
lever-prevalence = How many are exposed
lever-relative_risk = Relative risk
lever-among = Exposed among
lever-among-population = everybody (Levin)
lever-among-patients = patients, risk adjusted (Miettinen)
lever-months_earlier = Months earlier
lever-fewer_deaths_among = Fewer deaths among them by
lever-more = Row { $row }, { $lever }
levers-example-tracing = Tracing
levers-example-screening = Screening
levers-example-both = Both
levers-sentence = { $name }, after { $years ->
    [one] { $years } year
   *[other] { $years } years
  }: { $more } under care (95 of 100 runs: { $lower } to { $upper }); over the whole time { $patient_years } patient-years of care, { $lost } lost, { $deaths } deaths and { $cost } of discounted cost.
levers-best-sentence = For { $budget }, “{ $name }” gains most patient-years of care in { $share } of the runs.
levers-figure = Patients under care with each scenario; the bands are those of no change, for 50, 80 and 95 of 100 runs
levers-figure-described = Lines over { $years ->
    [one] { $years } year
   *[other] { $years } years
  } for the baseline and up to four scenarios, told apart by dashes and named at their ends.
levers-path-caption = Patients under care with each scenario
levers-change-caption = What “{ $name }” changes over { $years ->
    [one] { $years } year
   *[other] { $years } years
  }
levers-fraction-note = Share of newcomers due to the risk factor: { $fraction }.
difference-under_care = Under care at the end
difference-patient_years = Patient-years of care
difference-newcomers = Newcomers
difference-deaths = Deaths under care
difference-lost = Lost
difference-programme = Cost of the programme
difference-care = Cost of care
difference-cost = Cost in all
prices-caption = What each scenario buys, ranked by patient-years for { $budget }
prices-note = Cost is the programme's and that of the care it brings, discounted. A negative cost saves money. The ranking takes a programme to be as good for its money at any size.
price-per-patient-year = Cost per patient-year gained
price-per-death = Cost per death averted
price-no-gain = none gained
price-unsure = { $value }, but only { $gained } of the runs gain
best-for-patient-years = Gains most patient-years (share of runs)
best-for-deaths = Averts most deaths (share of runs)
sensitivity-of = Look more closely at
sensitivity-figure = “{ $name }”: cost per patient-year gained, one assumption changed at a time
sensitivity-described = A line for each assumption from an open dot at its low end to a filled dot at its high end, the widest on top; a vertical rule marks the cost as assumed.
sensitivity-caption = “{ $name }”: { $value } per patient-year gained as assumed, and with one assumption changed
sensitivity-note = Newcomers and rates go to their 95% limits, effects to half and one and a half times, costs 20% down and up.
sensitivity-none = “{ $name }” gains no patient-years of care, so there is no cost for each.
swing-what = Assumption
swing-low = Low end
swing-high = High end
swing-at-low = Cost at the low end
swing-at-high = Cost at the high end
swing-newcomers = Newcomers a year
swing-deaths = Rate of dying
swing-lost = Rate of loss
swing-completed = Rate of recovery or completion
swing-effect = Effect of the levers
swing-unit_costs = Costs of care
swing-programme = Cost of the programme
swing-discount = Discount, % a year
levers-method = Each percentage multiplies its rate or the newcomers; a risk factor acts through its attributable fraction (Levin 1953; Miettinen 1974). Every scenario shares the rates, newcomers and luck of the baseline in each of { $draws } runs (seed { $seed }), so that a difference is not blurred by chance. That a programme reaches these percentages is assumed, not shown.

break-even-title = How much must change?
break-even-type = Type a target to see how strong one lever must be.
break-even-kind = Lever
break-even-goal = What should change
break-even-target = Target
goal-under_care = patients under care at the end
goal-lost = lost, in all
goal-deaths = deaths, in all
goal-cost = discounted cost, in all
break-even-sentence = “{ $lever }” by { $percent }% from the first month on brings it to { $target } ({ $goal }, up to { $ends }), if rates are as observed. With it, { $share } of the runs reach the target or stay below.
break-even-never = No percentage brings it to { $target } ({ $goal }, up to { $ends }): “{ $lever }” by 0% gives { $none }, by { $percent }% { $most }.
break-even-caption = “{ $lever }” and { $goal }
break-even-method = The percentage is narrowed down by halving until the expected course meets the target; the share of runs comes from drawing rates and counts again at that percentage.

caution-lead_time_counts = “{ $name }” finds patients earlier: the months gained before they would have come count as care, though nobody lives longer by them.
caution-deaths_outside_unseen = “{ $name }” keeps patients who would have left. Those who die are then counted; had they left, their deaths would be in no count. More deaths under care need not mean more deaths.
caution-scenario_free = “{ $name }” has no cost of its own: nothing was typed.
refusal-no_scenarios = Type at least one lever.
refusal-lever_makes_no_difference = This lever does not move that figure at all.
back-test-title = Would it have been right?
back-years = Look back by years
back-test-held = On { $origin } this would have projected { $value } under care for { $ends } (95 of 100 runs: { $lower } to { $upper }). There were { $seen }: within the band.
back-test-missed = On { $origin } this would have projected { $value } under care for { $ends } (95 of 100 runs: { $lower } to { $upper }). There were { $seen }: outside the band. Something changed that the past did not show.
back-test-flows = It expected { $newcomers } newcomers and saw { $seen_newcomers }; it expected { $leaving } to leave and saw { $seen_leaving }.
back-test-figure = Projected from what was known on { $origin } (bands for 50, 80 and 95 of 100 runs), and what was seen (dots)
back-test-described = A line with three bands that widen, and a dashed line with dots for the number really under care; the table below holds the values.
back-test-path-caption = Projected and seen, every third month
axis-years-from-origin = Years from the earlier day
projected = Projected
projected-on = Projected on
seen = Seen
held-p50 = In the 50% band
held-p80 = In the 80% band
held-p95 = In the 95% band
back-tests-sentence = Projected from each of { $count } earlier years to today, the 95% band held { $held } times and the 80% band { $held80 } times.
back-tests-caption = Under care on { $ends }, as it would have been projected from earlier days
back-tests-note = Month by month since the day chosen above, the 50% band held in { $p50 } of the months, the 80% band in { $p80 }, the 95% band in { $p95 }. Neighbouring months share their luck.
back-test-method = The register as it would have been on the earlier day is projected to the closing date in the same way as above. Earlier days share their data, so their successes are not independent.
parts-title = Where the bands come from
parts-sentence = On { $ends }, most of the spread ({ $share }) comes from this: { $part }.
parts-figure = Where the spread of the number under care comes from
parts-described = One bar for each year, split into the shares of newcomers, leaving and chance.
parts-caption = Shares of the variance of the number under care
part-inflow = how many come a year
part-leaving = the rates of leaving
part-chance = chance among single patients
parts-method = Each source is redrawn by itself with the others held at what is expected, and its variance is set beside the sum of all three. A longer history narrows the first two, never the third.
caution-back_test_hindsight = The earlier day is seen with one piece of hindsight: patients lost by now count as lost since their last visit, though that was perhaps not yet known then.
caution-few_back_tests = Only { $count } earlier days can be tried: how often the bands held says little.
refusal-back_test_history_too_short = Before the earlier day there are only { $whole_years } whole years of newcomers; { $needed } are needed. Look back by fewer years.
back-test-method-trend = The register as it would have been on the earlier day is projected to the closing date in the same way as above, the trend of its newcomers carried on. Earlier days share their data, so their successes are not independent.
scenario-file-title = Keep what was typed
scenario-file-lead = Everything typed on this place – years, newcomers, what a patient takes, limits, levers – goes into a small file. No patient is in it. Opening it later, or elsewhere with another register, brings it all back.
scenario-file-save = Save what was typed
scenario-file-open = Open a saved file
scenario-file-opened = Opened: { $levers } levers and { $items } things that care takes.
scenario-file-strange = This file was not saved from here, or something in it cannot be read. Nothing was changed.
caution-trend_damped = Newcomers change by about { NUMBER($percent_per_year, maximumFractionDigits: 1) }% a year; that is carried on, and { NUMBER($damping, maximumFractionDigits: 2) } of it is left after each further year.
caution-register_incomplete = The register is said to hold { NUMBER($completeness, maximumFractionDigits: 0) }% of those under care: { NUMBER($count, maximumFractionDigits: 0) } patients are added, taken to have been here as long as the others.
refusal-trend_history_too_short = The register holds { $whole_years } whole years of newcomers; { $needed } are needed for a trend. Choose another way to newcomers.
refusal-trend_not_found = The yearly newcomers have no trend that can be carried on. Choose another way to newcomers.
caution-history_too_short = The register holds { $whole_years ->
    [0] no whole year
    [one] one whole year
   *[other] { $whole_years } whole years
  } of newcomers; { $needed } are needed to carry them forward. Type a number instead.
caution-newcomers_overdispersed = Newcomers differ between years more than chance would explain (by a factor of { NUMBER($dispersion, maximumFractionDigits: 1) }); the bands are widened for it.
caution-newcomers_trend = Newcomers have changed by about { NUMBER($percent_per_year, maximumFractionDigits: 0) }% a year. The projection does not carry the trend on: choose “the trend, damped” to do so.
caution-years_without_newcomers = { $count ->
    [one] In one year ({ $year }) nobody was registered
   *[other] In { $count } years (the first is { $year }) nobody was registered
  }. If registration had stopped, the mean is too low.
caution-old_cases_not_newcomers = { $count } patients were old cases when the register opened and are not counted as newcomers.
caution-no_newcomers_lately = Nobody has been registered since { $last }, { $days } days before the closing date. If registration lags behind, the last year is too low.
caution-retention_thin = Only { NUMBER($person_years, maximumFractionDigits: 0) } person-years and { $exits } leavings were seen: the rates of leaving are rough.
caution-no_exits_observed = Nobody left between { $from_years } and { $to_years } years since start. The rate there is taken as 0; it could be as high as { NUMBER($upper, maximumFractionDigits: 2) } a year.
caution-under_care_long_unseen = { $count } of those under care ({ $share }) were last seen over { $days } days before the closing date. Some may be lost: check them, for they swell the caseload.
caution-horizon_beyond_history = { $years } years ahead is longer than the { $history_years } years that the register has seen. Read the far end as a sketch.
caution-hazard_held = At the end, { $share } of those under care will be beyond { $from_years } years since start, where too little was seen: the rule chosen for them is a guess.
refusal-found_earlier_twice = One scenario can find patients earlier only once.
refusal-nobody_under_care = Nobody is under care at the closing date, so there is nobody to run forward.
refusal-no_person_time = Nobody was observed for even a day, so no rates can be worked out.
refusal-start_after_closing = Line { $line } starts after the closing date.
refusal-history_too_short = The register holds { $whole_years ->
    [0] no whole year
    [one] one whole year
   *[other] { $whole_years } whole years
  } of newcomers; { $needed } are needed to carry them forward. Choose “typed” and type a number.

## From counts

counts-title = From counts

counts-lead = For someone who has totals and no list. Type or paste numbers; nothing has to be opened, and the answers follow as you type.
counts-example = Fill with invented numbers
counts-clear = Clear
grid-cell = { $column }, row { $row }
grid-add = Add a row
grid-remove = Remove
grid-remove-row = Remove row { $row }
grid-paste-hint = Several cells copied from a spreadsheet can be pasted into any cell.
fault-negative = Not below 0.
fault-not-whole = A whole number.
fault-not-positive = More than 0.
fault-more-than-total = More than the total.

counts-life-table-title = A life table from totals
counts-life-table-lead = Count how many entered, and for each interval how many were lost, left otherwise or were still under care when the register closed, and met the outcome.
counts-life-table-empty = Type how many entered and at least one complete row.
counts-entering = Entered at the beginning
counts-intervals = The intervals, in order
width-years = Length in years
withdrawn-typed = Otherwise withdrawn
counts-life-table-sentence = { $survival } came through { $years } years without the outcome (95% interval { $interval }).

counts-strata-title = Two groups, by strata
counts-strata-lead = For each stratum (an age group, a stage, a hospital): how many of the group in question had the outcome, of how many; and the same for the group compared with.
counts-strata-empty = Type at least one complete row.
counts-strata-grid = The strata
stratum = Stratum
typed-exposed = the group in question
typed-unexposed = the group compared with
typed-exposed_events = In question: outcomes
typed-exposed_total = In question: patients
typed-unexposed_events = Compared with: outcomes
typed-unexposed_total = Compared with: patients
counts-strata-example-1 = Mild (invented)
counts-strata-example-2 = Severe (invented)
strata-caption = The two groups in each stratum (95% limits)
risk-exposed = Risk, in question
odds-exposed = Odds, in question
risk-unexposed = Risk, compared with
odds-unexposed = Odds, compared with
risk-of = { $events } of { $total }: { $risk }
exact-note = Exact odds ratio { $odds }; exact p { $p }, mid-p { $mid }.
crude-and-pooled = Lumped together the risk ratio is { $crude }; within strata, pooled, it is { $pooled }. If the two differ much, the strata differ in more than the outcome, and the lumped figure misleads.
strata-left-out = Left out of ratios because a group is empty, or nobody or everybody had the outcome: { $strata }.
strata-method = Risk ratio limits Katz (1978), odds ratio Woolf (1955), risk difference Newcombe (1998); pooled by Mantel & Haenszel (1959), variances of Robins, Breslow & Greenland (1986) and Greenland & Robins (1985); exact limits conditional on the margins.

counts-balance-title = Coming and leaving
counts-balance-lead = How many are under care now, how many come and how many leave each year.
counts-balance-empty = Type how many are under care, how many come each year, and at least one way of leaving.
balance-prevalent = Under care now
balance-new_per_year = New each year
balance-population = Population
balance-population-hint = If known, for rates per 100,000.
balance-years = Years ahead
balance-leaving = Leaving each year
balance-per-year = Patients a year
balance-example-died = Died (invented)
balance-example-lost = Lost (invented)
balance-example-moved_away = Moved away (invented)
balance-sentence = From { $now } now to { $then } in { $years } years if the same number leaves each year, or { $rate } if the same share does. { $turnover } leave for each 100 patient-years.
balance-steady = If nothing changed, the number would settle at { $steady }; a patient stays { $duration } years on average.
balance-population-sentence = Prevalence { $prevalence } and new cases { $incidence } a year, each per 100,000 people.
balance-caption = Under care in the coming years
after-years = After years
balance-fixed = Same number leaves
balance-constant = Same share leaves
balance-method = P + t (new − leaving) for the first, a constant rate of leaving for the second; the steady state is new per year times mean duration.

refusal-no_rows = Type at least one row.
refusal-uneven_rows = The rows are not complete.
refusal-nobody_entered = At least one patient must enter.
refusal-width_not_positive = Row { $row }: the length of the interval must be more than 0.
refusal-negative_count = A number of patients cannot be below 0.
refusal-more_left_than_entered = Row { $row }: { $left } leave, but only { $entering } are there when it begins.
refusal-more_events_than_patients = More outcomes ({ $events }) than patients ({ $total }).
refusal-population_not_above_prevalent = The population ({ $population }) must be larger than the number under care ({ $prevalent }).
caution-balance_short_horizon = The first column holds for { $limit } years at most: more patients also means more leaving. Read the second column.
caution-balance_paths_apart = By year { $year } the two columns differ ({ $under_care } and { $at_constant_rate }): read the second.
caution-balance_reaches_zero = With the same number leaving each year nobody would be left by year { $year }.
caution-nobody_leaves = Nobody leaves, so the number only grows and there is no steady state.
caution-not_in_steady_state = { $new_per_year } come and { $leaving_per_year } leave each year: the number is changing, so prevalence is not simply incidence times duration.
counts-district-title = A whole district, by age
counts-district-empty = Type at least one age group: people, share ill, new cases and deaths.
counts-district-lead = For a lifelong disease and a district without a register: from how many fall ill and how many die, well and ill, at each age.
district-caption = Age groups
district-from_age = From age
district-population = People
district-prevalence = Ill now, %
district-incidence = New cases per 1,000 well a year
district-mortality_well = Deaths per 1,000 well a year
district-mortality_ill = Deaths per 1,000 ill a year
district-last-age = The last group ends at age
district-years = Years ahead
district-sentence = Of { $now } ill now, { $then } will be ill in { $years ->
    [one] { $years } year
   *[other] { $years } years
  }, { $share } of the people.
district-steady = If the rates had always been these, { $steady } would be ill: { $distance } is how far today lies from that. In { $years ->
    [0] no time
    [one] { $years } year
   *[other] { $years } years
  } the number is within 1% of it.
district-steady-far = If the rates had always been these, { $steady } would be ill: { $distance } is how far today lies from that. Even a whole life does not close the gap.
district-figure = Share ill by age: now, in { $years } years, and in the steady state
district-figure-described = Steps by age group, one line for each of the three moments, told apart by dashes and named at their right end.
district-now = now
district-then = in { $years } years
district-in-steady-state = steady state
axis-age = Age
district-groups-caption = Ill by age
district-ages = Ages
district-ill-now = Ill now
district-share-now = Share now
district-ill-then = Ill in { $years } years
district-share-then = Share in { $years } years
district-share-steady = Share in the steady state
district-path-caption = Ill in the whole district
district-ill = Ill
district-share = Share of the people
district-method = Illness-death equation dp/dt = (1 − p)(i − p(m1 − m0)) along each generation, solved exactly within each half-year (Brinks & Landwehr 2014). Nobody recovers, moves in or out; each age keeps its number of people.
caution-ill_die_less = From age { $from_age } on, the ill are said to die less often than the well. Check the two rates: they may be exchanged.
caution-far_from_steady_state = Today lies { $share } from the steady state of these rates. Incidence times duration does not give the share of ill here, and rates that changed lately will show for decades.
caution-migration_ignored = People who move in or out, recovery, and changes of the rates are left out.
refusal-no_age_groups = Type at least one age group.
refusal-ages_not_rising = Each age group must begin after the one before, and the last must end after it begins.
refusal-ages_not_whole = Ages must be whole years from 0.
refusal-nobody_in_district = There are no people in these age groups.
caution-utilisation_at_or_above_one = { $places } places are too few: { $needed } would be taken on average.

refusal-utilisation_at_or_above_one = { $places } places are too few: { $needed } would be taken on average.

planning-title = How many the next audit needs
planning-lead = Before the next round: how many patients, or people to ask, are needed for an answer worth having.
planning-empty = Fill in every field; the number at the bottom may stay empty.
planning-question = What is to be found out
planning-survival_size = whether survival differs between two groups
planning-proportions_size = whether a share differs between two groups
planning-survey_size = how large a share is, by asking people
planning-accuracy_size = how good a test is
planning-hazard_ratio = Hazard ratio that must not be missed
planning-survival = Without the outcome, group compared with
planning-at_years = After so many years
planning-accrual_years = Years in which patients come
planning-follow_up_years = Years of follow-up after the last
planning-share_exposed = In the group in question
planning-lost = Lost before anything is known
planning-power = Power
planning-significance = Significance, two-sided
planning-available = Patients there are, if known (in question)
planning-exposed = Share, group in question
planning-reference = Share, group compared with
planning-reference_for_each = Compared with, for each in question
planning-proportion = Share expected
planning-margin = To within (percentage points)
planning-design_effect = Design effect
planning-response = Expected to answer
planning-confidence = Confidence
planning-population = Population, if small
planning-sensitivity = Sensitivity expected
planning-specificity = Specificity expected
planning-prevalence = With the disease, among those tested
planning-events = Outcomes
planning-survival-sentence = { $events } outcomes are needed to notice a hazard ratio of { $ratio } with a power of { $power }. About { $share } of the patients will have had the outcome by the close, so { $patients } patients have to be followed, those who will be lost included.
planning-survival-caption = What other ratios and powers would need
planning-power-sentence = With { $available } patients the power is { $power }.
planning-proportions-sentence = { $exposed } patients in the group in question and { $reference } in the other are needed for a power of { $power }.
planning-proportions-caption = Patients needed for other powers
planning-survey-sentence = Ask { $people } people. ({ $answers } answers would do from a population without limit.)
planning-accuracy-sentence = Test { $people } people: among them are the { $diseased } with the disease for the sensitivity ({ $sensitivity } to be tested) and the { $others } without it for the specificity ({ $specificity } to be tested).
planning-guess = The result is only as good as the guesses above it. Ask a statistician before patients are asked to take part in anything.
planning-survival-method = Schoenfeld (1981, 1983); patients come evenly, hazards are constant.
planning-proportions-method = Fleiss, Levin & Paik (2003), without continuity correction.
planning-survey-method = Cochran (1977), with the design effect and the finite population.
planning-accuracy-method = Buderer (1996).
fault-not-between = Between { $least } and { $greatest }.
fault-not-from-to = From { $least } to { $greatest }.
caution-few_planned_events = So small a number ({ $events } in the smallest cell or in all) is beyond what the formula is good for.
caution-margin_wider_than_proportion = The margin is as wide as the share itself: such a survey would say nothing.
refusal-not_a_share = { $field }: { $value } is not a share between 0 and 1.
refusal-nothing_to_notice = The two groups are supposed to be the same, so there is nothing to notice.
refusal-no_follow_up_planned = With neither accrual nor follow-up nothing can be seen.

## Report

report-title = Report

report-lead = Everything shown on the other places stands below, in the order it was first shown. Leave out what is not needed, then print it or keep it as one file.
report-empty = Nothing has been shown yet. Open a register or type totals, look at the answers, and come back.
report-field-title = Title
report-field-hospital = Hospital or programme
report-field-author = Prepared by
report-field-date = Date
report-date-hint = As it should be printed; this page never uses the computer's clock.
report-pieces = In the report
report-print = Print
report-save = Save as one HTML file
report-untitled = Follow-up report
report-no-byline = Hospital, author and date not supplied
report-made-with = Worked out on one computer with Vitalroll { $version }; no record left it.
figure-number = Figure { $number }. { $title }
table-number = Table { $number }. { $title }
about-data = The patients
about-data-sentence = { $n } patients who started between { $first } and { $last }, followed to the closing date of { $closing }: { $years } person-years in all.
about-file = File
about-fingerprint = Fingerprint of the file (SHA-256)
about-rows = Rows in the file
flow-caption = From the rows of the file to how follow-up ended
flow-stage = Stage
flow-rows = Rows in the file
flow-set-aside = Set aside
flow-analysed = Analysed
flow-changed = Analysed with a change
share = Share
