package state

import "strconv"

// PlaceTour is the place where the round trip is chosen.
const PlaceTour = "tour"

// doTour takes how often the hill is ridden there and back, 0 for one way, in
// one touch. What it is given comes from the page's own list.
func (s *State) doTour(a Action) bool {
	if a.Name != RoundTrip {
		return false
	}
	times, err := strconv.Atoi(a.Arg)
	if err != nil {
		return true
	}
	s.leave()
	back := "yes"
	if times == 0 {
		back, times = "no", 1
	}
	_ = s.set("ride.back", back)
	_ = s.set("ride.trips", strconv.Itoa(times)) // what is out of its range is left as it was
	return true
}

// RoundTrips is how often the hill is ridden there and back, 0 for one way; ok
// is false when it is ridden several times without the way back.
func (s *State) RoundTrips() (times int, ok bool) {
	times = max(1, int(s.Question.Ride.Trips+0.5))
	if s.Question.Ride.Back {
		return times, true
	}
	return 0, times == 1
}
