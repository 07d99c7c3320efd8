/**
 * What people try first, from memory of published lists of leaked passwords; no list was copied.
 * Everything here is in the plain form of `findPasswordFault`: small letters, no separators, `0` read
 * as `o`.
 */

const lines = (text: string): string[] => text.trim().split(/\s+/);

/** Long ones (15 characters and more as typed) that are refused as they are. */
export const COMMON_PASSWORDS: ReadonlySet<string> = new Set(
  lines(`
  correcthorsebatterystaple correcthorsebattery horsebatterystaple batterystaplecorrect
  thequickbrownfox thequickbrownfoxjumps thequickbrownfoxjumpsoverthelazydog quickbrownfoxjumps
  jumpsoverthelazydog loremipsumdolor loremipsumdolorsitamet tobeornottobe tobeornottobethatisthequestion
  onceuponatime onceuponatimeinaland happilyeverafter itwasadarkandstormynight callmeishmael
  twinkletwinkle twinkletwinklelittlestar maryhadalittlelamb humptydumptysatonawall jackandjillwentup
  rowrowrowyourboat itsybitsyspider jinglebellsjinglebells happybirthdaytoyou merrychristmas
  merrychristmaseveryone happynewyeareveryone wewishyouamerrychristmas silentnightholynight letitsnowletitsnow
  hellohellohello helloworldhelloworld helloworldhello hellomynameis goodmorningeveryone goodmorningclass
  ilovemyfamily ilovemymom ilovemydad ilovemydog ilovemycat ilovemywife ilovemyhusband ilovemykids ilovemylife
  iloveyousomuch iloveyouforever iloveyoumore iloveyouverymuch iloveyouiloveyou iloveschoolsomuch ihateschool
  ihatepasswords ihatethispassword iamthebestteacher bestteacherever worldsbestteacher numberoneteacher
  thisismypassword thisisapassword thisisasecret thisismysecret mypasswordis mypasswordissecret mysecretpassword
  mypasswordispassword passwordpassword passwordispassword passwordisnotpassword thepasswordispassword
  forgotmypassword iforgotmypassword idontknowmypassword idonotknowthepassword nopasswordneeded nopasswordhere
  changethispassword changemeplease pleasechangeme changeitlater changeitnow changepassword mynewpassword
  newpassword temporarypassword temporarypass defaultpassword defaultdefault initialpassword firstpassword
  verysecurepassword securepassword strongpassword verystrongpassword supersecretpassword superstrongpassword
  supersecret topsecretpassword secretsecretsecret letmeinletmein letmeinplease pleaseletmein opensesame
  opensesameopensesame openthedoorplease adminadminadmin administratoradministrator rootrootrootroot
  administratorpassword adminpassword teacherpassword schoolpassword studentpassword userpassword guestpassword
  welcomewelcome welcometomyclass welcometotheclub welcometoschool welcometothejungle welcomebackeveryone
  testtesttesttest testingtesting thisisatest thisisonlyatest testpassword testaccount testaccountpassword
  thisisalongpassword averylongpassword alongpassword longpassword longerpassword fifteencharacters
  fifteencharacterslong atleastfifteen atleastfifteencharacters mustbefifteencharacters useafewwordshere
  asentenceworkswell asentencethatworks whatsmypassword whatismypassword guessmypassword trytoguessthis
  youwillneverguess youcannotguessthis nobodyknowsthis nobodywillguessthis iamnotarobot areyouarobot
  maytheforcebewithyou maytheforce winteriscoming tobecontinued neversaynever livelaughlove livelovelaugh
  keepcalmandcarryon carpediem carpediemcarpediem hakunamatata yeswecanyeswecan godblessamerica ingodwetrust
  jesuschrist jesusismylord jesuslovesme thankyoujesus praisethelord godisgood godisgoodallthetime
  rainbowunicorn unicornsandrainbows sunshinesunshine princessprincess footballfootball baseballbaseball
  basketballbasketball soccersoccersoccer dragondragondragon monkeymonkeymonkey butterflybutterfly
  chocolatechocolate computercomputer internetinternet superman123456 batmanandrobin spiderman123456
  pokemonpokemon minecraftminecraft starwarsstarwars harrypotterharrypotter lightslightslights
  lightsoutlights turnonthelights turnoffthelights letthelightshine letthelightsshine festivaloflights
  christmaslights christmastreelights winterwonderland winterlights winterlightswinterlights townsquarelights
  lightsonthesquare thelightsofthesquare middleschoolteacher middleschoolmiddle schoolschoolschool
  classroomclassroom teacherteacherteacher homeworkhomework mathteachermath scienceteacher computerteacher
  coordinatorcoordinator volunteerofthelights blinkblinkblink onetwothreefour onetwothreefourfive
  onetwothreefourfivesix abcdefghijklmnop abcdefghijklmnopqrstuvwxyz abcdefghijklmno zyxwvutsrqponmlkjihgfedcba
  qwertyuiopasdfghjkl qwertyuiopasdfg qwertyuiopasdfghjklzxcvbnm qazwsxedcrfvtgb qazwsxedcrfvtgbyhnujm
  asdfghjklzxcvbnm zxcvbnmasdfghjkl qweasdzxcqweasdzxc zaqwsxcderfvbgt azertyuiopqsdfghjklm
  mondaytuesdaywednesday januaryfebruarymarch springsummerautumn springsummerfallwinter redorangeyellowgreen
  redgreenblueyellow northeastsouthwest appleorangebanana
`).map((line) => line.toLowerCase()),
);

/** Short ones and words of the place: what is left without them has to carry the password. */
export const CONTEXT_WORDS: readonly string[] = lines(`
  duskbell quillhaven winterlights winter lights light tarnroad tarn road intermediate middleschool middle school
  square townsquare lantern show shows lineup teacher student coordinator administrator admin class classroom
  password passwort passcode passphrase passw pass secret geheim letmein welcome iloveyou ilovemy ilove sunshine
  princess football baseball basketball soccer hockey dragon monkey master shadow superman batman trustno
  michael jordan jennifer ashley jessica charlie daniel thomas andrew hunter summer spring autumn
  computer internet changeme default temporary temp test testing guest user login access hello goodbye
  please thankyou whatever nothing freedom forever flower butterfly chocolate cookie cheese pepper ginger
  january february march april june july august september october november december
  monday tuesday wednesday thursday friday saturday sunday christmas halloween easter birthday
  starwars pokemon minecraft harrypotter mustang ferrari corvette yankees cowboys lakers
  google microsoft windows apple samsung
`);

/** Runs of keys, of the alphabet and of numbers, both ways, and years. */
export const KEYBOARD_RUNS: readonly string[] = lines(`
  qwertyuiop poiuytrewq asdfghjkl lkjhgfdsa zxcvbnm mnbvcxz qwerty qwertz azerty asdfgh zxcvb
  qazwsx wsxedc edcrfv rfvtgb tgbyhn yhnujm qweasd asdzxc 1qaz 2wsx 3edc 4rfv 1q2w3e4r 1q2w3e
  abcdefghijklmnopqrstuvwxyz abcdefgh abcdef abcd zyxwvut
  123456789o 123456789 12345678 1234567 123456 12345 1234 123 o987654321 987654321 87654321 7654321 654321 4321 321
  111111 222222 333333 444444 555555 666666 777777 888888 999999 oooooo 1111 2222 oooo 123123 121212 696969
  2o2o 2o21 2o22 2o23 2o24 2o25 2o26 2o27 2o28 2o29 2o3o 1999 2ooo 199o 198o
`);
