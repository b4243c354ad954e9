package main

import (
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"math"
	"strconv"
	"strings"

	"hillwright/physics/coast"
)

// The columns that a table of a coast-down may have.
const (
	colTime     = "time_s"
	colDistance = "distance_m"
	colMps      = "speed_mps"
	colKmh      = "speed_kmh"
	colMph      = "speed_mph"
)

// mps turns the speeds of a column into m/s.
var mps = map[string]float64{colMps: 1, colKmh: 1 / 3.6, colMph: 0.44704}

const tableExpected = "expected a first line such as time_s,speed_kmh or time_s,distance_m, then a line for each reading"

// readTable reads a coast-down without sound from comma-separated text: speeds
// read off a display, or stopwatch times at marks.
func readTable(r io.Reader) (coast.Run, error) {
	table := csv.NewReader(r)
	table.TrimLeadingSpace, table.Comment = true, '#'
	head, err := table.Read()
	if err != nil {
		return coast.Run{}, errors.New(tableExpected)
	}
	var run coast.Run
	if len(head) > 0 {
		head[0] = strings.TrimPrefix(head[0], "\ufeff") // as spreadsheets write it
	}
	what := ""
	if len(head) == 2 && strings.TrimSpace(head[0]) == colTime {
		what = strings.TrimSpace(head[1])
	}
	if mps[what] == 0 && what != colDistance {
		return run, fmt.Errorf("line 1: got %q; %s", strings.Join(head, ","), tableExpected)
	}
	for {
		row, err := table.Read()
		if err == io.EOF {
			return run, nil
		}
		if err != nil {
			return run, fmt.Errorf("%w; expected two numbers with a comma between them", err)
		}
		line, _ := table.FieldPos(0)
		var values [2]float64
		for i, text := range row {
			if values[i], err = strconv.ParseFloat(strings.TrimSpace(text), 64); err != nil || math.IsInf(values[i], 0) || math.IsNaN(values[i]) {
				return run, fmt.Errorf("line %d (%s): got %q, expected a number with a decimal point", line, head[i], text)
			}
		}
		if what == colDistance {
			run.Marks = append(run.Marks, coast.Mark{AtM: values[1], AtS: values[0], ErrorS: coast.ThumbErrorS})
		} else {
			run.Points = append(run.Points, coast.Point{AtS: values[0], SpeedMps: values[1] * mps[what], ErrorMps: coast.DisplayErrorMps})
		}
	}
}
