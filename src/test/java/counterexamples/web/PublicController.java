package counterexamples.web;

import org.springframework.web.bind.annotation.RestController;

/** A controller that every module could call. */
@RestController
public class PublicController {}
